package benchtrue.sheet;

/** What the simulated rig does: truth, noise, schedule and faults. */
public record Rehearsal(double durationSeconds) {}
