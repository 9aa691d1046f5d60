package benchtrue.screen;

import java.util.ArrayList;
import java.util.List;

/** The last rows: what went wrong, the question that is being answered, or the keys that work now. */
final class Footer {
    private Footer() {}

    static int rows(Shown shown) {
        return (shown.look().form == null ? 1 : 2) + (shown.trouble().isEmpty() ? 0 : 1);
    }

    static void draw(Canvas canvas, Shown shown) {
        int y = 0;
        if (!shown.trouble().isEmpty()) {
            canvas.bar(y++, canvas.fitted(shown.trouble() + "  (Esc: seen)", canvas.width()), Style.REVERSE);
        }
        Form form = shown.look().form;
        if (form == null) {
            keys(canvas, y, shown);
            return;
        }
        canvas.bar(y, canvas.fitted(form.title() + "  (Enter: done, Esc: leave it)", canvas.width()), Style.REVERSE);
        String prompt = form.prompt() + (canvas.ascii() ? "_" : "█");
        int tooLong = Math.max(0, canvas.width(prompt) - canvas.width());
        canvas.put(0, y + 1, prompt.substring(Math.min(tooLong, prompt.length())));
    }

    private static void keys(Canvas canvas, int y, Shown shown) {
        int x = 0;
        for (String[] key : now(shown)) {
            if (x + canvas.width(key[0]) + 1 + canvas.width(key[1]) > canvas.width()) {
                return;
            }
            x = canvas.put(x, y, key[0], Style.STRONG);
            x = canvas.put(x + 1, y, key[1]) + 2;
        }
    }

    private static List<String[]> now(Shown shown) {
        List<String[]> keys = new ArrayList<>();
        if (shown.look().setUp != null) {
            return List.of(
                    new String[] {"Enter", "do it, or accept it"},
                    new String[] {"s", "skip, with a reason"},
                    new String[] {"Esc", "close"});
        }
        if (shown.look().page != null) {
            keys.add(new String[] {"Esc", "back"});
            keys.add(new String[] {"↑ ↓", "scroll"});
        } else if (shown.look().opened) {
            keys.add(new String[] {"Esc", "back"});
        }
        for (Command command : Command.values()) {
            if (command.works(shown)) {
                keys.add(new String[] {command.key(), command.word(shown)});
            }
        }
        return keys;
    }
}
