package benchtrue.screen;

/** The panes, in the order in which Tab goes through them. */
enum PaneKind {
    ESTIMATES,
    LARGE,
    READINGS,
    INNOVATIONS,
    ALARMS,
    NEXT
}
