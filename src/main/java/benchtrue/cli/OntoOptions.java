package benchtrue.cli;

import benchtrue.source.CableFaults;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Option;

/** How the simulated instrument behaves on its port. */
final class OntoOptions {
    private static final String MAX = "max";

    @Option(
            names = "--pace",
            paramLabel = "N|max",
            description = "With --onto: N times real time, or as fast as the port takes it; by default 1.")
    private @Nullable String pace;

    @Option(
            names = "--cut",
            paramLabel = "EVERY:FOR",
            description = "With --onto: cut the cable every EVERY s for FOR s.")
    private @Nullable String cut;

    @Option(
            names = "--garble",
            paramLabel = "P",
            description = "With --onto: damage each line or answer with probability P.")
    private @Nullable String garble;

    /** Times real time, above 0; infinite: as fast as it goes. */
    double pace() throws Refusal {
        if (pace == null) {
            return 1;
        }
        double times = pace.equals(MAX) ? Double.POSITIVE_INFINITY : number(pace);
        if (times > 0 && (times < Double.POSITIVE_INFINITY || pace.equals(MAX))) {
            return times;
        }
        throw new Refusal("--pace: \"" + pace + "\" is neither a number above 0 nor max");
    }

    CableFaults faults() throws Refusal {
        double probability = garble == null ? 0 : number(garble);
        if (!(probability >= 0 && probability <= 1)) {
            throw new Refusal("--garble: \"" + garble + "\" is no probability; give a number from 0 to 1");
        }
        if (cut == null) {
            return new CableFaults(Double.POSITIVE_INFINITY, 0, probability);
        }
        int colon = cut.indexOf(':');
        double every = colon < 0 ? Double.NaN : number(cut.substring(0, colon));
        double lasting = number(cut.substring(colon + 1));
        if (lasting > 0 && lasting < every && every < Double.POSITIVE_INFINITY) {
            return new CableFaults(every, lasting, probability);
        }
        throw new Refusal("--cut: \"" + cut + "\" must be two numbers of seconds, the longer first, as in 60:5");
    }

    private static double number(String text) {
        try {
            return Double.parseDouble(text);
        } catch (NumberFormatException e) {
            return Double.NaN;
        }
    }
}
