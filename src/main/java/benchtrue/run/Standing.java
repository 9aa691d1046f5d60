package benchtrue.run;

/** How far an unknown has come, as screens and files say it. */
enum Standing {
    NOT_DETERMINED("not determined"),
    WEAK("weak"),
    SETTLING("settling"),
    SETTLED("settled");

    private final String word;

    Standing(String word) {
        this.word = word;
    }

    String word() {
        return word;
    }
}
