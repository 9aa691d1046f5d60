package benchtrue.cli;

import benchtrue.model.Memory;
import benchtrue.sheet.MemoryText;
import java.nio.file.Path;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Options that live runs and replays share. */
final class RunOptions {
    @Spec(Spec.Target.MIXEE)
    @SuppressWarnings("NullAway.Init")
    private CommandSpec spec;

    @Option(names = "--plain", description = "Plain lines instead of panes; by itself where there is no terminal.")
    private boolean plain;

    @Option(
            names = "--pace",
            paramLabel = "N|max",
            description = "Times real time, or max. Default: 20 in panes, max in plain lines.")
    private @Nullable String pace;

    @Option(
            names = "--memory",
            paramLabel = "MEMORY",
            description = "Instead of the sheet's: \"120 s\", \"600 readings\" or all.")
    private @Nullable String memory;

    @Option(names = "--factor", paramLabel = "F", description = "The same as a factor: 0 < F <= 1.")
    private @Nullable Double factor;

    @Option(
            names = "--reference",
            paramLabel = "RUN",
            description = "Judge drift against the model of this earlier run.")
    private @Nullable Path reference;

    @Option(names = "--out", paramLabel = "RUN", description = "Write the files of the run into this folder.")
    private @Nullable Path out;

    @Option(
            names = "--every",
            paramLabel = "N",
            defaultValue = "1",
            description = "One row of estimates.csv for so many readings. Default: ${DEFAULT-VALUE}.")
    private long every;

    @Option(names = "--json", description = "The summary as JSON on standard output, and nothing else there.")
    private boolean json;

    @Option(names = "--ascii", description = "Nothing but ASCII characters.")
    private boolean ascii;

    @Option(names = "--yes", description = "Answer questions with yes, and replace files that no replay wrote.")
    private boolean yes;

    /** Whether the run is to be shown in panes. */
    boolean inPanes(Map<String, String> environment) {
        return !plain && !json && Surroundings.canDraw(environment);
    }

    /** Times real time; infinite: as fast as it goes; null: not given. */
    @Nullable
    Double pace() {
        if (pace == null) {
            return null;
        }
        if (pace.equals("max")) {
            return Double.POSITIVE_INFINITY;
        }
        try {
            double times = Double.parseDouble(pace);
            if (times > 0 && times < Double.POSITIVE_INFINITY) {
                return times;
            }
        } catch (NumberFormatException e) {
            // Told below, as for any other value that is no pace.
        }
        throw wrong("--pace: \"" + pace + "\" is neither a number above 0 nor max");
    }

    /** Instead of the sheet's; null: not given. */
    @Nullable
    Memory memory() {
        if (memory != null && factor != null) {
            throw wrong("--memory and --factor say the same in two ways; give one of them");
        }
        if (memory != null) {
            Memory parsed = MemoryText.parse(memory);
            if (parsed == null) {
                throw wrong("--memory: \"" + memory + "\" is no memory; write \"120 s\", \"600 readings\" or all");
            }
            return parsed;
        }
        Memory ofFactor = factor == null ? null : MemoryText.ofFactor(factor);
        if (factor != null && ofFactor == null) {
            throw wrong("--factor: " + factor + " is not above 0 and at most 1");
        }
        return ofFactor;
    }

    @Nullable
    Path reference() {
        return reference;
    }

    @Nullable
    Path out() {
        return out;
    }

    long every() {
        if (every < 1) {
            throw wrong("--every: " + every + " is below 1");
        }
        return every;
    }

    boolean json() {
        return json;
    }

    boolean ascii() {
        return ascii;
    }

    boolean yes() {
        return yes;
    }

    private ParameterException wrong(String message) {
        return new ParameterException(spec.commandLine(), message);
    }
}
