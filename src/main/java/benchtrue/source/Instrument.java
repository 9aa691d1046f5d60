package benchtrue.source;

import benchtrue.sheet.PollSpec;
import java.math.BigDecimal;
import org.jspecify.annotations.Nullable;

/** The other end of a {@link Poller}: a simulated instrument. */
interface Instrument {
    static Instrument of(PollSpec spec) {
        return spec.asking() instanceof PollSpec.Modbus modbus
                ? new ModbusInstrument(modbus)
                : new ScpiInstrument((PollSpec.Scpi) spec.asking());
    }

    /**
     * Takes bytes as they come and answers the questions that they complete.
     *
     * @param cells what each channel indicates; null: no value
     * @return empty where there is nothing to answer
     */
    byte[] answer(byte[] bytes, int length, @Nullable BigDecimal[] cells);

    /** Nothing came for a while. */
    void silence();
}
