package benchtrue.source;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Fault;
import benchtrue.sheet.Rehearsal;
import benchtrue.source.Source.Outcome;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.time.Instant;
import java.time.format.DateTimeFormatter;
import java.time.format.DateTimeFormatterBuilder;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** The readings of the simulated rig: the same for the same sheet and seed, on every machine and Java. */
final class SimulatedRows implements Rows {
    private static final int NANO_DIGITS = 9;
    private static final int COARSEST_DIGITS = 6;
    private static final long NANOS = 1_000_000_000L;

    private final Rehearsal rehearsal;
    private final List<String> names;
    private final TrueRun truth;
    private final List<Indication> indications = new ArrayList<>();
    private final Noise garbling;
    private final @Nullable BigDecimal[] cells;
    private final int timeDigits;
    private final DateTimeFormatter dates;
    private long count;
    private double seconds;
    private boolean garbled;
    private boolean moving;
    private final double[] before;

    SimulatedRows(BenchSheet sheet, Rehearsal rehearsal, long seed) {
        this.rehearsal = rehearsal;
        truth = new TrueRun(sheet, rehearsal);
        List<Channel> channels = sheet.channels();
        names = channels.stream().map(Channel::name).toList();
        for (int channel = 0; channel < channels.size(); channel++) {
            indications.add(new Indication(channel, channels.get(channel), channels.size(), rehearsal, seed));
        }
        garbling = new Noise(seed, 0);
        cells = new BigDecimal[channels.size()];
        before = new double[channels.size()];
        timeDigits = timeDigits(rehearsal.ratePerSecond());
        dates = new DateTimeFormatterBuilder().appendInstant(timeDigits).toFormatter(Locale.ROOT);
    }

    /** As many decimals as give the interval exactly, else six. */
    private static int timeDigits(double rate) {
        BigDecimal interval = BigDecimal.ONE.divide(BigDecimal.valueOf(rate), NANO_DIGITS + 3, RoundingMode.HALF_EVEN);
        int digits = Math.max(0, interval.stripTrailingZeros().scale());
        return digits <= NANO_DIGITS ? digits : COARSEST_DIGITS;
    }

    /** Goes to the next reading that the rig sends, and makes its cells; false after the last. */
    boolean advance() {
        while (count < rehearsal.readings()) {
            seconds = count++ / rehearsal.ratePerSecond();
            double[] values = truth.next(seconds);
            moving = count > 1 && moves(values);
            System.arraycopy(values, 0, before, 0, before.length);
            for (int channel = 0; channel < cells.length; channel++) {
                cells[channel] = indications.get(channel).next(seconds, values[channel]);
            }
            if (comes()) {
                return true;
            }
        }
        return false;
    }

    private boolean moves(double[] values) {
        boolean moves = false;
        for (int channel = 0; channel < values.length; channel++) {
            Rehearsal.Instrument instrument = rehearsal.channels().get(channel);
            double hidden = Math.max(instrument.noise(), instrument.step().doubleValue());
            moves |= Math.abs(values[channel] - before[channel]) > hidden;
        }
        return moves;
    }

    private boolean comes() {
        boolean comes = true;
        garbled = false;
        for (Fault fault : rehearsal.faults()) {
            boolean now = fault.from() <= seconds && seconds < fault.to();
            if (fault instanceof Fault.Dropout || fault instanceof Fault.Restart) {
                comes &= !now;
            } else if (fault instanceof Fault.Garbled some) {
                garbled |= garbling.uniform() < some.probability() && now;
            }
        }
        return comes;
    }

    /** Whether the line of this reading is cut off on its way, so that the reading is lost. */
    boolean isGarbled() {
        return garbled;
    }

    /** Whether the truth has moved since the reading before by more than noise and resolution hide. */
    boolean isMoving() {
        return moving;
    }

    /** Real seconds since the start, whatever the device's clock says. */
    double seconds() {
        return seconds;
    }

    /** Of the channels, in the order of the cells. */
    List<String> names() {
        return names;
    }

    /** Each a whole number of steps; null where it is missing. Filled again. */
    @Nullable
    BigDecimal[] cells() {
        return cells;
    }

    /** By the device's clock: seconds since the start, or the date. */
    String time() {
        BigDecimal clock = clock();
        Instant start = rehearsal.start();
        if (start == null) {
            return clock.toPlainString();
        }
        return dates.format(start.plusNanos(nanos(clock)));
    }

    /** Seconds since the start by the device. */
    private BigDecimal clock() {
        double off = 0;
        for (Fault fault : rehearsal.faults()) {
            if (fault instanceof Fault.Restart restart && restart.to() <= seconds) {
                off += restart.clockSeconds();
            }
        }
        BigDecimal clock = BigDecimal.valueOf(seconds).setScale(timeDigits, RoundingMode.HALF_EVEN);
        return clock.add(BigDecimal.valueOf(off).setScale(timeDigits, RoundingMode.HALF_EVEN));
    }

    private static long nanos(BigDecimal seconds) {
        return seconds.scaleByPowerOfTen(NANO_DIGITS).longValueExact();
    }

    @Override
    public void next(ReplayRow into) {
        if (!advance()) {
            into.is(Outcome.END, count, "");
            return;
        }
        if (garbled) {
            into.is(Outcome.MALFORMED, count, "the line is cut off");
            return;
        }
        Instant start = rehearsal.start();
        long origin = start == null ? 0 : start.getEpochSecond() * NANOS + start.getNano();
        into.nanos = origin + nanos(clock());
        for (int channel = 0; channel < cells.length; channel++) {
            BigDecimal cell = cells[channel];
            into.values[channel] = cell == null ? Double.NaN : cell.doubleValue();
        }
        into.is(Outcome.READING, count, "");
    }

    @Override
    public boolean isDated() {
        return rehearsal.start() != null;
    }

    @Override
    public double progress() {
        return (double) count / rehearsal.readings();
    }

    @Override
    public void close() {}
}
