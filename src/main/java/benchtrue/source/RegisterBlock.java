package benchtrue.source;

import benchtrue.sheet.PollSpec;
import benchtrue.sheet.PollSpec.Register;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Values that stand one behind the other in an instrument, so that one question reads them all: at the same time, as far as the
 * instrument has them so.
 *
 * @param channels in the order of their registers
 * @param values one for each channel
 */
record RegisterBlock(List<Integer> channels, List<Register> values) {
    /** Most that one answer holds (Modbus Application Protocol V1.1b3, 6.3). */
    private static final int MOST_REGISTERS = 125;

    /** All values of the sheet, in the order of the first channel of each block. */
    static List<RegisterBlock> of(PollSpec.Modbus modbus) {
        List<Register> registers = modbus.registers();
        List<Integer> order = new ArrayList<>();
        for (int channel = 0; channel < registers.size(); channel++) {
            order.add(channel);
        }
        order.sort(Comparator.<Integer>comparingInt(c -> registers.get(c).address())
                .thenComparingInt(c -> registers.get(c).function())
                .thenComparingInt(c -> registers.get(c).register()));
        List<RegisterBlock> blocks = new ArrayList<>();
        for (int channel : order) {
            RegisterBlock last = blocks.isEmpty() ? null : blocks.get(blocks.size() - 1);
            if (last == null || modbus.single() || !last.isFollowedBy(registers.get(channel))) {
                last = new RegisterBlock(new ArrayList<>(), new ArrayList<>());
                blocks.add(last);
            }
            last.channels.add(channel);
            last.values.add(registers.get(channel));
        }
        blocks.sort(Comparator.comparingInt(
                block -> block.channels.stream().mapToInt(c -> c).min().orElse(0)));
        return blocks;
    }

    private boolean isFollowedBy(Register next) {
        return next.address() == first().address()
                && next.function() == first().function()
                && next.register() == first().register() + count()
                && count() + next.type().registers() <= MOST_REGISTERS;
    }

    /** Where the block begins, and whom it is asked of. */
    Register first() {
        return values.get(0);
    }

    /** How many registers it has. */
    int count() {
        return values.stream().mapToInt(value -> value.type().registers()).sum();
    }
}
