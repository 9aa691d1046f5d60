package benchtrue.alarm;

/**
 * The innovations of the live model: how they are autocorrelated, and their CUSUM. The live model follows a slow drift, so
 * this one sees only sudden faults; it raises an alarm of its own only while there is no reference model.
 */
final class LiveWatch {
    /** So many innovations must be known before their autocorrelation says how to thin them: fewer hide a slow period. */
    private static final int LEARN = 500;

    private static final int REDESIGN = 64;
    /** An alarm returns to normal after so many quiet readings. */
    private static final int QUIET = 256;

    private final Watched watched;
    private final Budget budget;
    private final AlarmBook book;
    private final Autocorrelation autocorrelation = new Autocorrelation();
    private final Cusum cusum = new Cusum();
    private CusumDesign design = new CusumDesign(0.5, Double.NaN);
    private int thinning;
    private int untilNext;
    private int untilDesign;
    private int quiet;

    LiveWatch(Watched watched, Budget budget, AlarmBook book) {
        this.watched = watched;
        this.budget = budget;
        this.book = book;
    }

    /**
     * @param t standardised innovation, within its bound
     * @param nu degrees of freedom of its standard deviation
     * @param raises whether this watch is the one that raises an alarm
     */
    void test(double t, double nu, long number, double time, boolean raises) {
        autocorrelation.add(t);
        if (--untilDesign <= 0) {
            design(nu);
        }
        if (thinning == 0 || --untilNext > 0) {
            return;
        }
        untilNext = thinning;
        cusum.step(ReferenceWatch.clip(t), design.slack(), number);
        judge(time, raises);
    }

    private void design(double nu) {
        untilDesign = REDESIGN;
        if (autocorrelation.count() >= LEARN) {
            thinning = autocorrelation.thinning();
            design = CusumDesign.of(budget.perReading() * Math.max(1, thinning), 0, nu);
        }
    }

    private void judge(double time, boolean raises) {
        quiet += thinning;
        if (!cusum.beyond(design.limit())) {
            if (quiet >= QUIET && raises) {
                book.normal(Alarm.Kind.STEP, watched.label(), null);
            }
            return;
        }
        quiet = 0;
        if (raises) {
            tell(
                    new Finding.Onset(Double.NaN, Double.NaN, time, cusum.since()),
                    ": the innovations of the live model have moved to one side since reading " + cusum.since());
        }
        cusum.clear();
    }

    /** A step that a row of outliers on one side has confirmed. */
    void tellStep(double t, long number, double now) {
        quiet = 0;
        tell(
                new Finding.Onset(Double.NaN, Double.NaN, now, number - OutlierGate.ROW + 1),
                ": a step, " + OutlierGate.ROW + " readings in a row are beyond their bound on one side, the last by "
                        + Words.number(t) + " standard deviations; a new segment begins");
    }

    private void tell(Finding.Onset onset, String words) {
        book.report(Finding.ofRelation(
                Alarm.Kind.STEP,
                watched.label(),
                onset,
                Double.NaN,
                watched.unit(),
                Alarm.Priority.NEXT_STOP,
                watched.label() + words + ". No reference model is adopted yet, so the cause is not told"));
    }

    void clear() {
        cusum.clear();
        autocorrelation.clear();
        thinning = 0;
        untilDesign = LEARN;
    }

    Autocorrelation autocorrelation() {
        return autocorrelation;
    }

    /** NaN until it is known how to thin. */
    double up() {
        return thinning == 0 ? Double.NaN : cusum.up() / design.limit();
    }

    double down() {
        return thinning == 0 ? Double.NaN : cusum.down() / design.limit();
    }
}
