package benchtrue.run;

import benchtrue.source.Source;

/** Opens a source from its beginning; each call another one. */
@FunctionalInterface
public interface SourceMaker {
    /** @throws java.io.UncheckedIOException where what was there at the start of the run is there no more */
    Source open();
}
