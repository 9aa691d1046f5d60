package benchtrue.record;

import benchtrue.run.Event;
import java.io.Closeable;
import java.nio.file.Path;
import java.util.function.Consumer;

/** events.csv: what happened, in order. Each event is in the file at once. */
final class EventsFile implements Closeable {
    static final String NAME = "events.csv";

    private final CsvOut csv;

    EventsFile(Path folder, Consumer<String> trouble) {
        csv = new CsvOut(new GrowingFile(folder.resolve(NAME), trouble));
        for (String column : "reading,time,event,relation,channel,unknown,value,unit,text".split(",", -1)) {
            csv.text(column);
        }
        csv.endRow();
        csv.flush();
    }

    void event(Event event) {
        csv.whole(event.reading()).number(event.time()).text(event.event());
        csv.text(event.relation()).text(event.channel()).text(event.unknown());
        csv.number(event.value()).text(event.unit()).text(event.text());
        csv.endRow();
        csv.flush();
    }

    @Override
    public void close() {
        csv.close();
    }
}
