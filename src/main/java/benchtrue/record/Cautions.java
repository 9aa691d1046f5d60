package benchtrue.record;

import java.util.List;

/** What every record warns of, whatever the rig. */
final class Cautions {
    static final List<String> GENERAL = List.of(
            "This program is not a safety instrument or protective device; alarms may be late or missing. Never wire it to"
                    + " an interlock. Local codes and licensed practitioners come first.",
            "A cause is a lead: make the rig safe before opening it. Depressurise and bleed, isolate, lock out and prove"
                    + " dead, keep clear of suspended loads and of rotating or hot parts.",
            "Not for trade: legal weighing and metering need approved instruments. A test record is not a calibration"
                    + " certificate and implies no accreditation.");

    private Cautions() {}
}
