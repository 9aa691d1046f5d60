package benchtrue.cli;

/** What the program says to whoever started it. Where several of 3 to 5 hold, the highest is given. */
enum ExitStatus {
    NOTHING_FOUND(0, "ended, nothing found"),
    FAULT(1, "a fault of the program"),
    USAGE(2, "wrong usage, or a mistake in a sheet or header"),
    FOUND(3, "the run found a drift alarm, a channel fault or a value outside its limits"),
    UNRELIABLE(4, "not to be relied on: an unknown is not determined, or the arithmetic cross-check disagrees"),
    SOURCE_LOST(5, "the source was lost or could not be read");

    private final int code;
    private final String meaning;

    ExitStatus(int code, String meaning) {
        this.code = code;
        this.meaning = meaning;
    }

    int code() {
        return code;
    }

    /** As the help lists it. */
    String helpLine() {
        return code + ":" + meaning;
    }
}
