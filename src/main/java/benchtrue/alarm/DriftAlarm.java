package benchtrue.alarm;

import org.jspecify.annotations.Nullable;

/** The one alarm of a relation against its reference: raised by CUSUM or bank, brought up to date, returned to normal. */
final class DriftAlarm {
    /** Without news the alarm is brought up to date after so many judgements. */
    private static final int REFRESH = 4;
    /** A change is over when the readings since some time are e^12.5 times likelier without it. */
    private static final double OVER = 25;

    private final Watched watched;
    private final AlarmBook book;
    private final Bank bank;
    private final Review review;
    private final CauseFinder finder;
    private final DriftWords words;
    private @Nullable Cause told;
    private double most;
    private int untilRefresh;
    private boolean stands;

    DriftAlarm(Watched watched, AlarmBook book, ReferenceWatch.Frozen frozen, Bank bank, Review review) {
        this.watched = watched;
        this.book = book;
        this.bank = bank;
        this.review = review;
        finder = new CauseFinder(bank, review, frozen);
        words = new DriftWords(watched, frozen);
    }

    /**
     * To be called after each evaluation of the bank.
     *
     * @param byCusum whether the CUSUM is beyond its limit
     * @param doubt why nothing is to be told now, or null
     */
    void judge(double time, Cusum cusum, boolean byCusum, double limit, @Nullable String doubt) {
        most = finder.most();
        if (doubt != null) {
            return;
        }
        if (stands && over(time)) {
            stands = false;
            told = null;
            book.normal(Alarm.Kind.STEP, watched.label(), null);
            bank.clear();
            cusum.clear();
            return;
        }
        boolean beyond = most > limit;
        if (beyond && !stands) {
            bank.evaluateAll();
        }
        if (!beyond && !(byCusum && !stands)) {
            return;
        }
        if (!stands || --untilRefresh <= 0 || news(limit)) {
            untilRefresh = REFRESH;
            tell(time, limit, cusum.since());
        }
    }

    /** Whether the leader changed, or leads enough for the first time. */
    private boolean news(double limit) {
        Cause before = told;
        if (before == null || finder.leader() != before.leader()) {
            return true;
        }
        return !before.named() && finder.most() > limit && finder.ahead() > CauseFinder.LEAD && !before.together();
    }

    private void tell(double time, double limit, long cusumSince) {
        Cause cause = sticky(finder.find(time));
        told = cause;
        stands = true;
        bank.onsets().keep(cause.onset().time());
        book.report(words.finding(cause, limit, time, cusumSince));
    }

    /** A cause that was named stays until another may be named or one alone does not explain it; an onset that was known better stays, too. */
    private Cause sticky(Cause found) {
        Cause before = told;
        if (before == null || found.together()) {
            return found;
        }
        if (found.leader() != before.leader()) {
            return before.named() && !found.named() ? before : found;
        }
        return found.with(found.named() || before.named(), keptOnset(before, found));
    }

    /**
     * When a step began shows in the readings next to it, which are told apart the better the younger they are: what was known
     * when the cause was named stays, unless it proves wrong. A ramp is dated better as it grows.
     */
    private Finding.Onset keptOnset(Cause before, Cause found) {
        Finding.Onset old = before.onset();
        Finding.Onset now = found.onset();
        boolean beyondMemory = old.from() < review.oldest();
        boolean agrees = old.from() <= now.to() && now.from() <= old.to();
        return beyondMemory || (before.named() && before.ramp() == found.ramp() && !found.ramp() && agrees) ? old : now;
    }

    /** Whether the readings since some time speak against the change; while its cause is not known, against any change. */
    private boolean over(double time) {
        Cause cause = told;
        if (cause == null) {
            return false;
        }
        return cause.named()
                ? review.against(cause, time) > OVER
                : review.quiet(cause.onset().time());
    }

    boolean stands() {
        return stands;
    }

    /** Whether its cause is not named. */
    boolean provisional() {
        return told == null || !told.named();
    }

    double most() {
        return most;
    }
}
