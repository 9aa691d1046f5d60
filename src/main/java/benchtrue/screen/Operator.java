package benchtrue.screen;

import benchtrue.alarm.Alarm;
import benchtrue.model.Memory;
import benchtrue.run.Act;
import benchtrue.run.Control;
import benchtrue.run.Desk;
import benchtrue.run.Snapshot;
import benchtrue.sheet.Durations;
import benchtrue.sheet.MemoryText;
import java.util.List;
import java.util.Objects;
import java.util.function.Predicate;
import org.jspecify.annotations.Nullable;

/** Does what a command asks: looks elsewhere, asks for words, or sends the run a message. */
final class Operator {
    private static final String MISSING = "(something must be written: it goes into the record)";

    private final Desk desk;
    private final Look look;
    private final Page sheet;

    Operator(Desk desk, Look look, Page sheet) {
        this.desk = desk;
        this.look = look;
        this.sheet = sheet;
    }

    void obey(Command command, Shown shown) {
        Snapshot snapshot = shown.snapshot();
        switch (command) {
            case HELP -> look.open(HelpPage.page());
            case SHEET -> look.open(sheet);
            case BELL -> look.bell = !look.bell;
            case LARGE ->
                look.unknown = (look.unknown + 1) % Math.max(1, shown.unknowns().size());
            case PAUSE ->
                desk.send(snapshot.phase() == Snapshot.Phase.PAUSED ? new Control.Resume() : new Control.Pause());
            case STEP -> desk.send(new Control.Step());
            case FASTER -> desk.send(new Control.Faster());
            case SLOWER -> desk.send(new Control.Slower());
            case NEXT_ALARM -> desk.send(new Control.NextAlarm());
            case AGAIN -> desk.send(new Control.Restart());
            case CLOSING -> desk.send(new Control.Summarise());
            case HOLD -> desk.send(snapshot.held() ? new Act.Release() : new Act.Hold());
            case SET_UP -> look.setUp = new SetUp(desk, look);
            case CLOSE -> close(snapshot);
            case FREEZE -> {} // the display is the screen's own
            default -> ask(command, shown);
        }
    }

    private void close(Snapshot snapshot) {
        if (!snapshot.live() || snapshot.phase() == Snapshot.Phase.ENDED) {
            desk.send(new Control.Close());
            return;
        }
        look.form = new Form("Close the live run?", List.of("yes or no"), answers -> {
            if (answers.get(0).equals("yes")) {
                desk.send(new Control.Close());
            }
            return "";
        });
    }

    private void ask(Command command, Shown shown) {
        look.form = switch (command) {
            case ACKNOWLEDGE -> acknowledge(shown);
            case SHELVE -> shelve(shown);
            case MARK ->
                new Form("A mark in the record", List.of("note"), a -> needed(a.get(0), new Act.Mark(a.get(0))));
            case MEMORY -> new Form("Memory of the estimator", List.of("120 s, 600 readings, or all"), this::memory);
            case GO_TO -> new Form("Go to a time of the run", List.of("seconds, or min:s"), this::goTo);
            case ADOPT ->
                new Form(
                        "Adopt the present model as the reference",
                        List.of("your name", "reason"),
                        a -> a.get(0).isEmpty() ? MISSING : needed(a.get(1), new Act.Adopt(a.get(0), a.get(1))));
            case SEGMENT ->
                new Form("Begin a new segment", List.of("reason"), a -> needed(a.get(0), new Act.NewSegment(a.get(0))));
            default -> null;
        };
    }

    private String needed(String answer, Act act) {
        if (answer.isEmpty()) {
            return MISSING;
        }
        desk.send(act);
        return "";
    }

    /** The chosen alarm if it is one of the wanted, else the newest that is. */
    private @Nullable Alarm alarm(Shown shown, Predicate<Alarm> wanted) {
        List<Alarm> alarms = AlarmsPane.sorted(shown);
        if (look.alarm < alarms.size() && wanted.test(alarms.get(look.alarm))) {
            return alarms.get(look.alarm);
        }
        return alarms.stream().filter(wanted).findFirst().orElse(null);
    }

    private @Nullable Form acknowledge(Shown shown) {
        Alarm alarm = alarm(shown, a -> !a.acknowledged());
        return alarm == null
                ? null
                : new Form("Acknowledge " + named(alarm), List.of("comment"), a -> {
                    desk.send(new Act.Acknowledge(alarm.id(), a.get(0)));
                    return "";
                });
    }

    private @Nullable Form shelve(Shown shown) {
        Alarm alarm = alarm(shown, Command::stands);
        return alarm == null
                ? null
                : new Form("Shelve " + named(alarm), List.of("for how long (10 min)", "reason"), a -> {
                    double seconds = Durations.seconds(a.get(0));
                    if (!(seconds > 0)) {
                        return "(how long: a number and s, min or h)";
                    }
                    return needed(a.get(1), new Act.Shelve(alarm.id(), seconds, a.get(1)));
                });
    }

    private static String named(Alarm alarm) {
        return "alarm " + alarm.id() + ", " + alarm.kind().word() + " "
                + Objects.requireNonNullElse(alarm.channel(), Objects.requireNonNullElse(alarm.relation(), ""));
    }

    private String memory(List<String> answers) {
        Memory memory = MemoryText.parse(answers.get(0));
        if (memory == null) {
            return "(a memory is \"120 s\", \"600 readings\" or all)";
        }
        desk.send(new Act.ChangeMemory(memory));
        return "";
    }

    private String goTo(List<String> answers) {
        double seconds = 0;
        try {
            for (String part : answers.get(0).split(":", -1)) {
                seconds = 60 * seconds + Double.parseDouble(part);
            }
        } catch (NumberFormatException e) {
            return "(a time is 380 or 6:20)";
        }
        if (!(seconds >= 0)) {
            return "(a time is 380 or 6:20)";
        }
        desk.send(new Control.JumpTo(seconds));
        return "";
    }
}
