package benchtrue.run;

/** Takes one reading after the other from row to estimate, test, alarm and event. */
public final class Engine {}
