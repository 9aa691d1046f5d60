package benchtrue.sheet;

import benchtrue.model.DecisionRule;
import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * A bench sheet that was read without a mistake. All quantities are in the units that the sheet gives them; lists are in
 * the order of the file.
 *
 * @param title what is measured, for people
 * @param item what is under test, or empty
 * @param cautions hazards that the sheet names for this rig, printed beside the general ones
 * @param warmUpSeconds readings before this time of the run are shown but not used; 0: none
 * @param rule chosen beforehand; null: none was chosen, so no verdict is given
 * @param sha256 of the bytes of the file, in hexadecimal
 */
public record BenchSheet(
        String title,
        String item,
        List<String> cautions,
        double warmUpSeconds,
        List<Channel> channels,
        List<Derived> derived,
        List<Group> groups,
        List<Result> results,
        List<Joint> joint,
        List<Point> points,
        List<Exclusion> exclusions,
        ReferenceSpec reference,
        Alarms alarms,
        @Nullable DecisionRule rule,
        @Nullable LineSpec line,
        @Nullable PollSpec poll,
        @Nullable Rehearsal rehearsal,
        String sha256) {

    /** The same with another memory in all its relations. */
    public BenchSheet with(Memory memory) {
        List<Group> otherGroups = groups.stream()
                .map(g -> new Group(
                        g.relations(),
                        g.unknowns(),
                        new Forgetting(g.forgetting().kind(), memory)))
                .toList();
        return new BenchSheet(
                title,
                item,
                cautions,
                warmUpSeconds,
                channels,
                derived,
                otherGroups,
                results,
                joint,
                points,
                exclusions,
                reference,
                alarms,
                rule,
                line,
                poll,
                rehearsal,
                sha256);
    }
}
