package benchtrue.alarm;

import benchtrue.model.Forgetting;
import benchtrue.model.Interval;
import benchtrue.model.Unit;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Group;
import benchtrue.sheet.UnknownSpec;
import java.util.List;

/** Settings that tests of this package share. */
final class Rig {
    static final Interval ANY = new Interval(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);

    private Rig() {}

    static UnknownSpec unknown(String name, boolean constantTerm) {
        return new UnknownSpec(name, Unit.ONE, constantTerm, null, Double.NaN, null, 0);
    }

    static Channel channel(String name, Interval interval, double resolution) {
        return new Channel(name, Unit.ONE, interval, resolution, Double.NaN, 0, false, false, null, null, null);
    }

    /** y = a·x + b·z + c, on channels x and z. */
    static Watched plane() {
        return new Watched(
                "y",
                "V",
                List.of(unknown("a", false), unknown("b", false), unknown("c", true)),
                new int[] {0, 1, 2},
                new int[] {},
                List.of(List.of("x"), List.of("z"), List.of()),
                true);
    }

    static Group group(Watched watched) {
        return new Group(List.of(), watched.unknowns(), Forgetting.NONE);
    }
}
