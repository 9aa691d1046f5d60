package benchtrue.run;

import benchtrue.alarm.Alarm;

/** Why a verdict is withheld. */
final class Withheld {
    private Withheld() {}

    static String because(Alarm alarm) {
        return alarm.kind().word() + " alarm " + alarm.id() + " stands";
    }
}
