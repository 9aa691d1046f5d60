package benchtrue.screen;

import benchtrue.run.Act;
import benchtrue.run.Control;
import benchtrue.run.Desk;
import benchtrue.run.Snapshot;
import com.googlecode.lanterna.input.KeyStroke;
import com.googlecode.lanterna.input.KeyType;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * The checks before a live run, one after the other. Each is done, or skipped with a reason; both go into the record. What is
 * observed changes no reading: a zero that is off is to be corrected in the sheet.
 */
final class SetUp {
    private static final double QUIET_SECONDS = 60;
    private static final double ZERO_SECONDS = 10;

    /** A check. */
    private enum Step {
        WARM_UP("warm-up", "Let instruments and rig reach their working temperature. Enter when they are warm."),
        ZERO("zero", "Bring every channel to its zero, the rig made safe. Enter begins, and after 10 s accepts."),
        SIGN("sign", "Enter begins; push one quantity up by hand, within its limits; Enter accepts what is seen."),
        QUIET("quiet minute", "Leave the rig alone at one operating point. Enter begins; after 60 s Enter accepts."),
        POINTS("points", "The planned points are ticked off as the run visits them. Enter begins the run.");

        private final String word;
        private final String words;

        Step(String word, String words) {
            this.word = word;
            this.words = words;
        }
    }

    private final Desk desk;
    private final Look look;
    private final List<String> done = new ArrayList<>();
    private int now;
    private boolean observing;

    SetUp(Desk desk, Look look) {
        this.desk = desk;
        this.look = look;
    }

    private Step step() {
        return Step.values()[now];
    }

    void take(KeyStroke key, Shown shown) {
        if (key.getKeyType() == KeyType.Escape) {
            close();
        } else if (key.getKeyType() == KeyType.Enter) {
            enter(shown.snapshot());
        } else if (key.getKeyType() == KeyType.Character && key.getCharacter() == 's') {
            look.form = new Form("Skip the check: " + step().word, List.of("reason"), answers -> {
                if (answers.get(0).isEmpty()) {
                    return "(a reason must be written: it goes into the record)";
                }
                record(true, answers.get(0));
                return "";
            });
        }
    }

    private void enter(Snapshot snapshot) {
        switch (step()) {
            case WARM_UP -> record(false, "warm after " + Texts.span(snapshot.reading() == 0 ? 0 : snapshot.time()));
            case POINTS -> record(false, snapshot.points().size() + " planned points");
            default -> {
                if (!observing) {
                    observing = true;
                    desk.send(new Control.BeginSpell());
                } else if (snapshot.spell() != null && snapshot.spell().seconds() >= least()) {
                    record(false, String.join("; ", observed(snapshot.spell())));
                }
            }
        }
    }

    private double least() {
        return step() == Step.QUIET ? QUIET_SECONDS : step() == Step.ZERO ? ZERO_SECONDS : 0;
    }

    private void record(boolean skipped, String text) {
        desk.send(new Act.SetUp(step().word, skipped, text));
        done.add(step().word + (skipped ? " skipped: " : ": ") + text);
        desk.send(new Control.EndSpell());
        observing = false;
        now++;
        if (now == Step.values().length) {
            close();
        }
    }

    private void close() {
        desk.send(new Control.EndSpell());
        look.setUp = null;
    }

    /** What the present check is about for each channel. */
    private List<String> observed(Snapshot.SpellView spell) {
        List<String> lines = new ArrayList<>();
        for (Snapshot.ChannelSpell c : spell.channels()) {
            String unit = c.unit().isEmpty() ? "" : " " + c.unit();
            lines.add(
                    switch (step()) {
                        case ZERO -> zero(c, unit);
                        case SIGN -> c.name() + moved(c, unit);
                        default ->
                            c.name() + " noise " + Texts.value(c.sd(), 2) + unit + ", step " + Texts.value(c.step(), 2)
                                    + unit + String.format(Locale.ROOT, ", autocorrelation %+.2f", c.autocorrelation());
                    });
        }
        if (step() == Step.QUIET) {
            lines.add("rate " + Texts.value(spell.rate(), 4) + " /s");
        }
        return lines;
    }

    private static String zero(Snapshot.ChannelSpell c, String unit) {
        String mean = Texts.value(c.mean(), 4);
        boolean off = Math.abs(c.mean()) > 2 * c.u();
        return c.name() + " " + mean + " ± " + Texts.value(2 * c.u(), 2) + unit
                + (off ? ", off: to correct it, the sheet needs correction = \"x - (" + mean + ")\"" : "");
    }

    private static String moved(Snapshot.ChannelSpell c, String unit) {
        if (!(Math.abs(c.change()) > 3 * noise(c))) {
            return " still";
        }
        return (c.change() > 0 ? " up by " : " down by ") + Texts.value(Math.abs(c.change()), 3) + unit;
    }

    /** What neighbours differ by, so that the push itself does not count. */
    private static double noise(Snapshot.ChannelSpell c) {
        return c.sd() * Math.sqrt(Math.max(0, 1 - c.autocorrelation()));
    }

    Page page(Shown shown) {
        return new Page("Set-up: " + step().word, width -> lines(shown.snapshot(), width));
    }

    private List<String> lines(Snapshot snapshot, int width) {
        List<String> lines = new ArrayList<>(Texts.wrapped(
                "Local codes and licensed practice come first. Keep guards, limits and the emergency stop in force.",
                width));
        lines.add("");
        for (int i = 0; i < Step.values().length; i++) {
            lines.add((i < now ? "done  " : i == now ? "now   " : "      ") + Step.values()[i].word);
        }
        lines.add("");
        lines.addAll(Texts.wrapped(step().words, width));
        Snapshot.SpellView spell = snapshot.spell();
        if (observing && spell != null) {
            lines.add("");
            lines.add(Texts.span(spell.seconds()) + (least() > 0 ? " of " + Texts.span(least()) : ""));
            observed(spell).forEach(l -> lines.addAll(Texts.wrapped(l, width)));
        }
        if (step() == Step.POINTS) {
            snapshot.points().forEach(p -> lines.add((p.visited() ? "[x] " : "[ ] ") + p.text()));
        }
        List<String> before = snapshot.setUp().stream()
                .filter(l -> l.startsWith(step().word) && !done.contains(l))
                .toList();
        if (!before.isEmpty()) {
            lines.add("");
            lines.addAll(Texts.wrapped("last time: " + before.get(before.size() - 1), width));
        }
        if (!done.isEmpty()) {
            lines.add("");
            done.forEach(l -> lines.addAll(Texts.wrapped(l, width)));
        }
        return lines;
    }
}
