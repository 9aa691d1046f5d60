package benchtrue.run;

import benchtrue.estimate.Diagnosis;
import benchtrue.model.Memory;
import benchtrue.sheet.UnknownSpec;
import java.util.Arrays;

/**
 * Which unknowns of a group are settled: determined and not weak, their U within the wanted one, the innovations steady and no
 * alarm standing, all of it for one effective memory. Evaluated now and then, at readings that do not depend on any clock.
 */
final class Settling {
    /** What counts as one memory where nothing is forgotten. */
    private static final double READINGS_WITHOUT_FORGETTING = 100;

    private static final int OFTEN = 16;
    private static final int SELDOM = 256;

    private final GroupRun run;
    private final double[] sinceTime;
    private final long[] sinceReading;
    private final Standing[] standings;
    private Diagnosis diagnosis;
    private long lastReading;

    Settling(GroupRun run) {
        this.run = run;
        int p = run.estimates().length;
        sinceTime = new double[p];
        sinceReading = new long[p];
        standings = new Standing[p];
        diagnosis = run.estimator().diagnose();
        restart();
    }

    void restart() {
        Arrays.fill(sinceReading, -1);
        Arrays.fill(standings, Standing.NOT_DETERMINED);
        lastReading = 0;
    }

    /** Whether so many readings have passed that a look is worth its cost. */
    boolean due(long reading) {
        long patience = Math.max(OFTEN, Math.min(SELDOM, run.estimator().rows() / OFTEN));
        return reading - lastReading >= patience;
    }

    void evaluate(long reading, double time, boolean alarmStands) {
        lastReading = reading;
        diagnosis = run.estimator().diagnose();
        Estimates now = run.now();
        boolean steady = true;
        for (int k = 0; k < run.specs().size(); k++) {
            steady &= run.track(k).isSteady();
        }
        for (int i = 0; i < standings.length; i++) {
            standings[i] = standing(i, now, steady && !alarmStands, reading, time);
        }
    }

    private Standing standing(int i, Estimates now, boolean quiet, long reading, double time) {
        if (!diagnosis.determined()[i] || Double.isNaN(now.values()[i]) || run.onlyNoise(i)) {
            sinceReading[i] = -1;
            return Standing.NOT_DETERMINED;
        }
        UnknownSpec spec = run.group().unknowns().get(i);
        boolean narrow = Double.isNaN(spec.wanted()) || now.of(i).expanded() <= spec.wanted();
        if (diagnosis.weak()[i] || !narrow || !quiet) {
            sinceReading[i] = -1;
        } else if (sinceReading[i] < 0) {
            sinceReading[i] = reading;
            sinceTime[i] = time;
        }
        if (diagnosis.weak()[i]) {
            return Standing.WEAK;
        }
        return sinceReading[i] >= 0 && oneMemoryAgo(reading - sinceReading[i], time - sinceTime[i])
                ? Standing.SETTLED
                : Standing.SETTLING;
    }

    private boolean oneMemoryAgo(long readings, double seconds) {
        Memory memory = run.forgetting().memory();
        if (memory instanceof Memory.Seconds time) {
            return seconds >= time.seconds();
        }
        return readings >= (memory instanceof Memory.Readings count ? count.count() : READINGS_WITHOUT_FORGETTING);
    }

    Standing of(int unknown) {
        return standings[unknown];
    }

    boolean allSettled() {
        return Arrays.stream(standings).allMatch(s -> s == Standing.SETTLED);
    }

    boolean allDetermined() {
        return Arrays.stream(standings).noneMatch(s -> s == Standing.NOT_DETERMINED);
    }

    Diagnosis diagnosis() {
        return diagnosis;
    }
}
