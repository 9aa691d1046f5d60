package benchtrue.cli;

import java.util.List;

/** The command cannot be done as it was given; each message names the place and what to do. Ends with a status, not a trace. */
final class Refusal extends Exception {
    private static final long serialVersionUID = 1;

    private final transient List<String> messages;
    private final ExitStatus status;

    Refusal(ExitStatus status, List<String> messages) {
        super(String.join("\n", messages), null, false, false);
        this.messages = List.copyOf(messages);
        this.status = status;
    }

    Refusal(String message) {
        this(ExitStatus.USAGE, List.of(message));
    }

    List<String> messages() {
        return messages;
    }

    ExitStatus status() {
        return status;
    }
}
