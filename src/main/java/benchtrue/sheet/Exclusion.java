package benchtrue.sheet;

/** Readings with from ≤ time ≤ to, in seconds since the first reading, are not used, for the reason given. */
public record Exclusion(double from, double to, String reason) {}
