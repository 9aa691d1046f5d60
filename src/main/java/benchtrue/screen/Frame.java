package benchtrue.screen;

import benchtrue.run.Snapshot;
import java.util.List;
import java.util.Map;

/** Draws one frame: banner, panes or a page over them, footer. */
final class Frame {
    private final Canvas canvas;
    private final Shown shown;

    private Frame(Canvas canvas, Shown shown) {
        this.canvas = canvas;
        this.shown = shown;
    }

    static void draw(Canvas canvas, Shown shown) {
        canvas.blank();
        if (Layout.fits(canvas.width(), canvas.height())) {
            new Frame(canvas, shown).draw();
        } else {
            tooSmall(canvas, shown.snapshot());
        }
    }

    private static void tooSmall(Canvas canvas, Snapshot snapshot) {
        String words = "This window has " + canvas.width() + " x " + canvas.height() + " characters; the panes need "
                + Layout.LEAST_WIDTH + " x " + Layout.LEAST_HEIGHT + ". The run goes on: "
                + Texts.count(snapshot.reading(), "reading") + ", "
                + Texts.count(snapshot.alarms().size(), "alarm") + ".";
        Line.draw(canvas, Line.wrapped(words, canvas.width(), 0), 0);
    }

    private void draw() {
        int banner = Layout.bannerRows(canvas.height());
        new Banner(shown).draw(canvas.part(0, 0, canvas.width(), banner));
        int footer = Footer.rows(shown);
        Footer.draw(canvas.part(0, canvas.height() - footer, canvas.width(), footer), shown);
        Canvas body = canvas.part(0, banner, canvas.width(), canvas.height() - banner - footer);
        SetUp setUp = shown.look().setUp;
        Page page = setUp == null ? shown.look().page : setUp.page(shown);
        if (page != null) {
            page(body, page);
        } else if (shown.look().opened) {
            pane(body, shown.look().focus);
        } else {
            panes(body);
        }
    }

    private void page(Canvas body, Page page) {
        title(body, page.title(), true);
        Canvas text = body.part(1, 1, body.width() - 2, body.height() - 1);
        List<Line> lines =
                page.lines().apply(text.width()).stream().map(Line::of).toList();
        shown.look().pageFrom = Math.max(0, Math.min(shown.look().pageFrom, lines.size() - text.height()));
        Line.draw(text, lines, shown.look().pageFrom);
    }

    private void panes(Canvas body) {
        Map<PaneKind, Layout.Place> places = Layout.of(
                body.width(),
                body.height(),
                EstimatesPane.rows(shown),
                shown.snapshot().channels().size());
        places.forEach((kind, place) -> pane(body.part(place.x(), place.y(), place.width(), place.height()), kind));
        places.forEach((kind, place) -> {
            for (int y = place.y(); place.x() > 0 && y < place.y() + place.height(); y++) {
                body.put(place.x() - 1, y, "│");
            }
        });
    }

    private void pane(Canvas place, PaneKind kind) {
        Pane pane = switch (kind) {
            case ESTIMATES -> new EstimatesPane();
            case LARGE -> new LargePane();
            case READINGS -> new ReadingsPane();
            case INNOVATIONS -> new InnovationsPane();
            case ALARMS -> new AlarmsPane();
            case NEXT -> new NextPane();
        };
        title(place, pane.title(shown), shown.look().focus == kind && shown.look().page == null);
        pane.draw(place.part(0, 1, place.width(), place.height() - 1), shown);
    }

    private static void title(Canvas place, String title, boolean focused) {
        String start = focused ? "▸ " : "─ ";
        String text = start + place.fitted(title, place.width() - 4) + " ";
        int end = place.put(0, 0, text, Style.STRONG);
        place.put(end, 0, "─".repeat(Math.max(0, place.width() - end)));
    }
}
