package benchtrue.sheet;

/** How readings come over a serial line. */
public record LineSpec(String port, int baud, String frame) {}
