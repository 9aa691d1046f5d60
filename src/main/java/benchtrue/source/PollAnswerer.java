package benchtrue.source;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.LineSpec;
import benchtrue.sheet.PollSpec;
import benchtrue.sheet.Rehearsal;
import java.io.IOException;
import java.util.Arrays;

/** Answers on a port for the polled instruments of the simulated rig, with what they indicate at the time. */
public final class PollAnswerer {
    private static final int CHUNK = 512;
    private static final double NANOS = 1e9;

    private final SerialLink link;
    private final Ticker ticker;
    private final PresentRig rig;
    private final Instrument instrument;
    private final Cable cable;
    private final double pace;

    PollAnswerer(SerialLink link, Ticker ticker, PresentRig rig, Instrument instrument, Cable cable, double pace) {
        this.link = link;
        this.ticker = ticker;
        this.rig = rig;
        this.instrument = instrument;
        this.cable = cable;
        this.pace = pace;
    }

    /**
     * Returns when the rehearsal is over.
     *
     * @param rehearsal the sheet's own, as are {@code poll} and {@code line}
     * @param pace of the rig, times real time; finite
     * @return how many answers were sent
     * @throws IOException where the port cannot be opened, or is gone
     */
    public static long answer(
            BenchSheet sheet,
            Rehearsal rehearsal,
            PollSpec poll,
            LineSpec line,
            String port,
            double pace,
            CableFaults faults,
            long seed)
            throws IOException, InterruptedException {
        try (PortLink link = PortLink.open(port, line)) {
            PollAnswerer answerer = new PollAnswerer(
                    link,
                    Ticker.SYSTEM,
                    new PresentRig(sheet, rehearsal, seed),
                    Instrument.of(poll),
                    new Cable(faults, seed),
                    pace);
            long count = answerer.run();
            link.drain();
            return count;
        }
    }

    long run() throws IOException {
        byte[] chunk = new byte[CHUNK];
        long start = ticker.nanos();
        long count = 0;
        for (double now = 0; !rig.isOver(now * pace); now = (ticker.nanos() - start) / NANOS) {
            int length = link.read(chunk);
            if (SerialLibrary.isEnding()) {
                break;
            }
            if (length < 0) {
                throw new IOException("the port is gone after " + count + " answers");
            }
            byte[] answer = answered(chunk, length, (ticker.nanos() - start) / NANOS);
            if (answer.length > 0) {
                link.write(answer, answer.length);
                count++;
            }
        }
        return count;
    }

    /** What goes out over the cable, which may be nothing. */
    private byte[] answered(byte[] chunk, int length, double now) {
        boolean on = rig.isOnAt(now * pace);
        if (length == 0) {
            instrument.silence();
        }
        if (length == 0 || !on || cable.isCut(now)) {
            return new byte[0];
        }
        byte[] answer = instrument.answer(chunk, length, rig.cells());
        return cable.carry(rig.isGarbled() ? Arrays.copyOf(answer, answer.length / 2) : answer, now);
    }
}
