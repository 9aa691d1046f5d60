package benchtrue.screen;

import benchtrue.alarm.Alarm;
import benchtrue.run.Snapshot;
import org.jspecify.annotations.Nullable;

/** What a key does, in the order of the footer. */
enum Command {
    HELP('?', "help", "This page.", When.ALWAYS),
    ACKNOWLEDGE('a', "acknowledge", "Acknowledge the chosen alarm, with a comment.", When.WAITING),
    PAUSE('p', "pause", "Pause the replay, or let it go on.", When.DRIVEN),
    STEP('.', "step", "One reading, then pause.", When.DRIVEN),
    FASTER('+', "faster", "Replay faster.", When.DRIVEN),
    SLOWER('-', "slower", "Replay slower.", When.DRIVEN),
    NEXT_ALARM('n', "next alarm", "Go to the next alarm, then pause.", When.DRIVEN),
    CLOSE('q', "close", "Close the run: the closing summary is printed after the screen.", When.ALWAYS),
    CLOSING('e', "summary", "The closing summary over what has been read.", When.READ),
    LARGE('u', "unknown", "Draw the next unknown large.", When.SEVERAL),
    FREEZE(' ', "freeze", "Freeze the display, never the run; a new alarm thaws it.", When.ALWAYS),
    SHEET('v', "sheet", "The bench sheet: equations, channels, limits.", When.ALWAYS),
    GO_TO('g', "go to", "Go to a time of the run, then pause.", When.REPLAY),
    AGAIN('0', "start", "Back to the first reading.", When.REPLAY),
    MARK('m', "mark", "Put a mark with a note into the record.", When.RUNNING),
    MEMORY('y', "memory", "Change the memory of the estimator.", When.RUNNING),
    HOLD('h', "hold", "Hold the estimates, or release them: readings are tested but not used.", When.RUNNING),
    ADOPT('r', "adopt", "Adopt the present model as the reference, with name and reason.", When.RUNNING),
    SEGMENT('b', "segment", "Begin a new segment: before and after are not pooled.", When.RUNNING),
    SHELVE('z', "shelve", "Shelve the chosen alarm for a time, with a reason.", When.STANDING),
    SET_UP('s', "set-up", "The checks before the run: warm-up, zero, sign, quiet minute, planned points.", When.LIVE),
    BELL('l', "bell", "Switch the bell of new alarms off or on.", When.ALWAYS);

    /** On what it depends whether a key works. */
    private enum When {
        ALWAYS,
        RUNNING,
        DRIVEN,
        REPLAY,
        LIVE,
        READ,
        SEVERAL,
        WAITING,
        STANDING
    }

    private final char character;
    private final String word;
    private final String help;
    private final When when;

    Command(char character, String word, String help, When when) {
        this.character = character;
        this.word = word;
        this.help = help;
        this.when = when;
    }

    static @Nullable Command of(char typed) {
        for (Command command : values()) {
            if (command.character == typed) {
                return command;
            }
        }
        return null;
    }

    boolean works(Shown shown) {
        Snapshot snapshot = shown.snapshot();
        boolean running = snapshot.phase() != Snapshot.Phase.ENDED;
        return switch (when) {
            case ALWAYS -> true;
            case RUNNING -> running;
            case DRIVEN -> running && !snapshot.live();
            case REPLAY -> !snapshot.live();
            case LIVE -> running && snapshot.live();
            case READ -> snapshot.reading() > 0;
            case SEVERAL -> shown.unknowns().size() > 1;
            case WAITING -> snapshot.alarms().stream().anyMatch(a -> !a.acknowledged());
            case STANDING -> snapshot.alarms().stream().anyMatch(Command::stands);
        };
    }

    static boolean stands(Alarm alarm) {
        return alarm.state() == Alarm.State.RAISED || alarm.state() == Alarm.State.ACKNOWLEDGED;
    }

    String key() {
        return character == ' ' ? "Space" : Character.toString(character);
    }

    /** What it would do now. */
    String word(Shown shown) {
        return switch (this) {
            case PAUSE -> shown.snapshot().phase() == Snapshot.Phase.PAUSED ? "go on" : word;
            case FREEZE -> shown.frozen() ? "thaw" : word;
            case HOLD -> shown.snapshot().held() ? "release" : word;
            default -> word;
        };
    }

    String help() {
        return help;
    }
}
