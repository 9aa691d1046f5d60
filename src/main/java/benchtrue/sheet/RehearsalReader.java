package benchtrue.sheet;

import org.jspecify.annotations.Nullable;

/** What the simulated rig does. */
final class RehearsalReader {
    private RehearsalReader() {}

    /** Null where the sheet has no [rehearsal]. */
    static @Nullable Rehearsal read(Keys sheet, ChannelsReader channels, RelationsReader relations) {
        Keys keys = sheet.table("rehearsal", "[rehearsal]");
        return keys == null ? null : new Rehearsal(keys.seconds("duration", Double.NaN));
    }
}
