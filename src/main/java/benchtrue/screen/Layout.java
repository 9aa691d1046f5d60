package benchtrue.screen;

import java.util.EnumMap;
import java.util.Map;

/**
 * Where the panes stand: estimates across the whole width, below them on the left the path and the alarms, on the right
 * readings, innovations and what to do next.
 */
final class Layout {
    static final int LEAST_WIDTH = 72;
    static final int LEAST_HEIGHT = 20;

    private static final int RICH_HEIGHT = 30;

    /** A rectangle of cells; its first row is the title. */
    record Place(int x, int y, int width, int height) {}

    private Layout() {}

    static boolean fits(int width, int height) {
        return width >= LEAST_WIDTH && height >= LEAST_HEIGHT;
    }

    /** Rows of the banner on a screen of this height. */
    static int bannerRows(int height) {
        return height >= RICH_HEIGHT ? 3 : 1;
    }

    /**
     * The panes in a body of this size.
     *
     * @param estimates rows that show all estimates
     * @param channels rows that show all channels
     */
    static Map<PaneKind, Place> of(int width, int height, int estimates, int channels) {
        int top = Math.max(3, Math.min(estimates, height * 2 / 5)) + 1;
        int rest = height - top;
        int left = width * 5 / 8;
        int right = width - left - 1;
        int alarms = Math.max(4, rest * 2 / 5);
        int readings = Math.max(2, Math.min(channels + 1, rest / 3));
        int next = Math.max(4, rest * 3 / 10);
        Map<PaneKind, Place> places = new EnumMap<>(PaneKind.class);
        places.put(PaneKind.ESTIMATES, new Place(0, 0, width, top));
        places.put(PaneKind.LARGE, new Place(0, top, left, rest - alarms));
        places.put(PaneKind.ALARMS, new Place(0, height - alarms, left, alarms));
        places.put(PaneKind.READINGS, new Place(left + 1, top, right, readings));
        places.put(PaneKind.INNOVATIONS, new Place(left + 1, top + readings, right, rest - readings - next));
        places.put(PaneKind.NEXT, new Place(left + 1, height - next, right, next));
        return places;
    }
}
