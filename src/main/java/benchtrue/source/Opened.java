package benchtrue.source;

import benchtrue.sheet.Mistake;
import java.util.List;

/** What became of opening a source. */
public sealed interface Opened {
    /** @param notices what deserves a look, as columns that the sheet does not name; to be shown once */
    record Ready(Source source, List<Mistake> notices) implements Opened {}

    /** @param mistakes at least one, each with its place and remedy */
    record Refused(List<Mistake> mistakes) implements Opened {}
}
