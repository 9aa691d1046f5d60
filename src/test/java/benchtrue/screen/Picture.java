package benchtrue.screen;

import benchtrue.run.Snapshot;
import com.googlecode.lanterna.TerminalSize;
import com.googlecode.lanterna.TextCharacter;
import com.googlecode.lanterna.graphics.BasicTextImage;

/** A frame as text. */
final class Picture {
    private Picture() {}

    static Shown shown(Snapshot snapshot) {
        return new Shown(snapshot, new Look(), Double.NaN, "");
    }

    static String of(Shown shown, int width, int height, boolean ascii) {
        BasicTextImage image = new BasicTextImage(new TerminalSize(width, height));
        Frame.draw(new Canvas(image.newTextGraphics(), ascii, new Cells()), shown);
        StringBuilder text = new StringBuilder();
        for (int y = 0; y < height; y++) {
            StringBuilder row = new StringBuilder();
            for (int x = 0; x < width; x++) {
                TextCharacter cell = image.getCharacterAt(x, y);
                row.append(cell.getCharacterString());
                if (cell.isDoubleWidth()) {
                    x++;
                }
            }
            text.append(row.toString().stripTrailing()).append('\n');
        }
        return text.toString();
    }

    static String of(Snapshot snapshot, int width, int height) {
        return of(shown(snapshot), width, height, false);
    }
}
