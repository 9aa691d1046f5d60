package benchtrue.alarm;

/**
 * One change of an alarm, for the log.
 *
 * @param what raised, again, cause, acknowledged, shelved, unshelved, returned
 * @param alarm as it stands after the change
 */
public record Change(String what, Alarm alarm, long reading, double time) {}
