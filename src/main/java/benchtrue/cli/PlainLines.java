package benchtrue.cli;

import benchtrue.run.ClockText;
import benchtrue.run.Closing;
import benchtrue.run.EstimateRow;
import benchtrue.run.Event;
import benchtrue.run.RunListener;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Group;
import benchtrue.sheet.UnknownSpec;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Set;

/** A run in plain lines: what happens as it happens, and now and then how far the estimates have come. */
final class PlainLines implements RunListener {
    /** What may come with every reading belongs in the record, not in front of the operator. */
    private static final Set<String> TOO_OFTEN = Set.of("held out", "used again", "tested", "not tested", "malformed");

    private static final int PROGRESS_LINES = 10;
    private static final double FIRST_STEP = 1;
    private static final double LOOK_EVERY = 16;

    private final Output output;
    private final List<UnknownSpec> unknowns = new ArrayList<>();
    private double nextProgress = FIRST_STEP;
    private double step = FIRST_STEP;
    private int sinceWider;
    private long malformed;

    PlainLines(Output output, BenchSheet sheet) {
        this.output = output;
        for (Group group : sheet.groups()) {
            unknowns.addAll(group.unknowns());
        }
        output.line(sheet.title() + (sheet.item().isEmpty() ? "" : ", " + sheet.item()));
        for (Group group : sheet.groups()) {
            group.relations().forEach(r -> output.line("  " + r.relation().text()));
        }
    }

    @Override
    public boolean wants(long reading) {
        return reading % LOOK_EVERY == 1;
    }

    /** Lines come at intervals that grow with the run, so that a long one does not bury its events. */
    @Override
    public void reading(EstimateRow row) {
        if (!(row.time >= nextProgress)) {
            return;
        }
        StringBuilder line = new StringBuilder();
        for (int i = 0; i < unknowns.size(); i++) {
            line.append(i == 0 ? "" : "   ").append(progress(unknowns.get(i), row.estimates[i], row.uncertainties[i]));
        }
        say(row.time, line.toString());
        if (++sinceWider == PROGRESS_LINES) {
            sinceWider = 0;
            step *= 10;
        }
        nextProgress = Math.max(nextProgress + step, Math.floor(row.time / step + 1) * step);
    }

    private static String progress(UnknownSpec unknown, double estimate, double u) {
        if (Double.isNaN(estimate)) {
            return unknown.name() + " not determined";
        }
        return String.format("%s %.6g (u %.2g)", unknown.name(), estimate, u);
    }

    @Override
    public void event(Event event) {
        if (event.event().equals("malformed") && malformed++ < PROGRESS_LINES) {
            say(event.time(), "line left out: " + event.text());
        }
        if (TOO_OFTEN.contains(event.event())) {
            return;
        }
        String subject = event.channel() != null ? event.channel() : event.relation();
        say(
                event.time(),
                event.event().toUpperCase(Locale.ROOT) + " "
                        + (subject == null || event.text().contains(subject) ? "" : subject + ": ")
                        + event.text());
    }

    private void say(double time, String line) {
        output.line(String.format("%10s  %s", ClockText.of(time), line));
    }

    @Override
    public void closed(Closing closing) {}
}
