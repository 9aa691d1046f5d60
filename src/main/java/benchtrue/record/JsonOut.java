package benchtrue.record;

import benchtrue.model.Interval;
import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.StreamWriteFeature;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.core.util.Separators;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** Indented JSON into memory, the same on every machine; numbers that are not finite and absent texts are null. */
final class JsonOut {
    private static final JsonFactory FACTORY = JsonFactory.builder()
            .enable(StreamWriteFeature.USE_FAST_DOUBLE_WRITER)
            .build();

    private final JsonGenerator json;

    private JsonOut(JsonGenerator json) {
        this.json = json;
    }

    /** A part of a document. */
    @FunctionalInterface
    interface Part {
        void write(JsonOut out) throws IOException;
    }

    /** The text of a document, ended by a line feed. */
    static String text(Part document) {
        StringWriter text = new StringWriter();
        try (JsonGenerator json = FACTORY.createGenerator(text)) {
            DefaultIndenter indenter = new DefaultIndenter("  ", "\n");
            DefaultPrettyPrinter printer = new DefaultPrettyPrinter(
                    Separators.createDefaultInstance().withObjectFieldValueSpacing(Separators.Spacing.AFTER));
            printer.indentObjectsWith(indenter);
            printer.indentArraysWith(indenter);
            json.setPrettyPrinter(printer);
            document.write(new JsonOut(json));
        } catch (IOException e) {
            throw new UncheckedIOException("writing to memory", e);
        }
        return text.append('\n').toString();
    }

    void object(String name, Part fields) throws IOException {
        json.writeFieldName(name);
        object(fields);
    }

    void object(Part fields) throws IOException {
        json.writeStartObject();
        fields.write(this);
        json.writeEndObject();
    }

    <T> void array(String name, List<T> items, Each<T> each) throws IOException {
        json.writeFieldName(name);
        array(items, each);
    }

    <T> void array(List<T> items, Each<T> each) throws IOException {
        json.writeStartArray();
        for (T item : items) {
            each.write(item);
        }
        json.writeEndArray();
    }

    /** Writes one item of an array. */
    @FunctionalInterface
    interface Each<T> {
        void write(T item) throws IOException;
    }

    void string(@Nullable String value) throws IOException {
        json.writeString(value);
    }

    void number(double value) throws IOException {
        if (Double.isFinite(value)) {
            json.writeNumber(value);
        } else {
            json.writeNull();
        }
    }

    void text(String name, @Nullable String value) throws IOException {
        json.writeStringField(name, value);
    }

    void number(String name, double value) throws IOException {
        json.writeFieldName(name);
        number(value);
    }

    void whole(String name, long value) throws IOException {
        json.writeNumberField(name, value);
    }

    void truth(String name, boolean value) throws IOException {
        json.writeBooleanField(name, value);
    }

    /** {@code [lower, upper]}, an open side null; null where there is none. */
    void interval(String name, @Nullable Interval interval) throws IOException {
        if (interval == null) {
            json.writeNullField(name);
        } else {
            array(name, List.of(interval.lower(), interval.upper()), this::number);
        }
    }

    void nothing(String name) throws IOException {
        json.writeNullField(name);
    }
}
