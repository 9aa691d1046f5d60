package benchtrue.cli;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;

/** An invented bench for tests of the finished jar: V = R·I + V0 with R = 2 Ω, V0 = 0.1 V and 10 mV of noise. */
final class Bench {
    static final String SHEET = """
            title = "Resistor on the bench"
            item = "R17"

            [channels]
            I = { unit = "A", interval = [0, 10] }
            V = { unit = "V", interval = [-1, 30], noise = 0.01 }

            [[relations]]
            equation = "V = R*I + V0"
            memory = "all"

            [line]
            baud = 115200
            """;

    private Bench() {}

    /** Line number {@code i} from 0, without its end. */
    static String line(int i) {
        SplittableRandom random = new SplittableRandom(i);
        double current = 1 + i / 7 % 5;
        return String.format(Locale.ROOT, "%.1f,%.5f", current, 2 * current + 0.1 + 0.01 * random.nextGaussian());
    }

    static byte[] lines(int from, int to) {
        StringBuilder all = new StringBuilder();
        for (int i = from; i < to; i++) {
            all.append(line(i)).append("\r\n");
        }
        return all.toString().getBytes(StandardCharsets.US_ASCII);
    }

    /** The program, started with these arguments. */
    static Process start(Path out, String... arguments) throws IOException {
        List<String> command = new ArrayList<>(List.of(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-Xmx512m",
                "-jar",
                System.getProperty("benchtrue.jar")));
        command.addAll(Arrays.asList(arguments));
        ProcessBuilder builder =
                new ProcessBuilder(command).redirectErrorStream(true).redirectOutput(out.toFile());
        builder.environment().put("LC_ALL", "C.UTF-8");
        return builder.start();
    }

    /** Runs the program to its end; what it printed. */
    static String run(Path out, String... arguments) throws IOException, InterruptedException {
        start(out, arguments).waitFor();
        return Files.readString(out);
    }

    /** The rows of readings.csv that hold values, as lines were sent. */
    static List<String> recorded(Path run) throws IOException {
        List<String> rows = new ArrayList<>();
        String text = Files.readString(run.resolve("readings.csv"));
        for (String row :
                text.substring(0, text.lastIndexOf('\n') + 1).lines().skip(1).toList()) {
            String[] cells = row.split(",", -1);
            if (!cells[1].equals("unread")) {
                rows.add(String.format(
                        Locale.ROOT, "%.1f,%.5f", Double.parseDouble(cells[1]), Double.parseDouble(cells[2])));
            }
        }
        return rows;
    }
}
