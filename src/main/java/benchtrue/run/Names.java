package benchtrue.run;

import benchtrue.sheet.Group;
import java.util.List;

/** Names of the unknowns of a group. */
final class Names {
    private Names() {}

    static List<List<String>> groups(Group group, List<List<Integer>> places) {
        return places.stream()
                .map(one ->
                        one.stream().map(i -> group.unknowns().get(i).name()).toList())
                .toList();
    }
}
