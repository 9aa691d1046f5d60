package benchtrue.screen;

import com.googlecode.lanterna.SGR;

/** How a text stands out. Never by colour: the same on every terminal, and for every eye. */
enum Style {
    PLAIN,
    STRONG,
    REVERSE;

    SGR[] codes() {
        return switch (this) {
            case PLAIN -> new SGR[0];
            case STRONG -> new SGR[] {SGR.BOLD};
            case REVERSE -> new SGR[] {SGR.BOLD, SGR.REVERSE};
        };
    }
}
