package benchtrue.screen;

import java.util.EnumMap;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** What the operator has chosen to look at. Belongs to the thread of the screen. */
final class Look {
    PaneKind focus = PaneKind.ESTIMATES;

    /** Whether the focused pane takes the whole body. */
    boolean opened;

    /** Place of the unknown that is drawn large. */
    int unknown;

    /** Place of the chosen alarm, newest first. */
    int alarm;

    /** Text that lies over the panes; null: none. */
    @Nullable
    Page page;

    /** First line of the page that is shown. */
    int pageFrom;

    /** Question that is being answered in the last rows; null: none. */
    @Nullable
    Form form;

    /** The checks before a live run; null: not open. */
    @Nullable
    SetUp setUp;

    boolean bell = true;

    private final Map<PaneKind, Integer> from = new EnumMap<>(PaneKind.class);
    private final Decimals decimals = new Decimals();

    /** First line of a pane that is shown. */
    int from(PaneKind pane) {
        return from.getOrDefault(pane, 0);
    }

    void scroll(PaneKind pane, int lines) {
        from.put(pane, Math.max(0, from(pane) + lines));
    }

    void open(Page text) {
        page = text;
        pageFrom = 0;
    }

    Decimals decimals() {
        return decimals;
    }
}
