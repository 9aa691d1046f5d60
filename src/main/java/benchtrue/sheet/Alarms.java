package benchtrue.sheet;

/** @param falseAlarmsPerSecond how many false alarms of the whole program are accepted, above 0 */
public record Alarms(double falseAlarmsPerSecond) {}
