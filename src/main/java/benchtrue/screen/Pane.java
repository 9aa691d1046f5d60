package benchtrue.screen;

/** One part of the screen: a function of what is shown. */
interface Pane {
    /** For the row above it. */
    String title(Shown shown);

    void draw(Canvas canvas, Shown shown);
}
