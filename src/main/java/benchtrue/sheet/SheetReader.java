package benchtrue.sheet;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import org.tomlj.Toml;
import org.tomlj.TomlParseError;
import org.tomlj.TomlParseResult;

/** Reads bench sheets. Every mistake of a file is found in one pass, with its line and column and what to do. */
public final class SheetReader {
    private static final long LARGEST = 1 << 20;

    private SheetReader() {}

    public static SheetReading read(Path file) {
        try {
            if (Files.isDirectory(file)) {
                return refused(
                        file, "is a folder, not a bench sheet", "name the file, as in " + file.resolve("sheet.toml"));
            }
            if (Files.size(file) > LARGEST) {
                return refused(
                        file, "is larger than 1 MB, which no bench sheet is", "name the sheet, not the readings");
            }
            return read(String.valueOf(file), Files.readAllBytes(file));
        } catch (NoSuchFileException e) {
            return refused(file, "there is no such file", "check the name");
        } catch (IOException e) {
            return refused(file, "cannot be read (" + e.getMessage() + ")", "check its permissions");
        }
    }

    private static SheetReading refused(Path file, String message, String remedy) {
        return new SheetReading(null, List.of(new Mistake(String.valueOf(file), 0, 0, message, remedy)), List.of());
    }

    /** @param name as the user named the file */
    public static SheetReading read(String name, byte[] bytes) {
        String text;
        try {
            text = StandardCharsets.UTF_8
                    .newDecoder()
                    .decode(ByteBuffer.wrap(bytes))
                    .toString();
        } catch (CharacterCodingException e) {
            return new SheetReading(
                    null,
                    List.of(new Mistake(
                            name, 0, 0, "is not UTF-8", "save it as UTF-8; ° and Ω are often what is wrong")),
                    List.of());
        }
        SheetText sheet = new SheetText(name, withoutMark(text));
        TomlParseResult toml = Toml.parse(withoutMark(text));
        for (TomlParseError error : toml.errors()) {
            sheet.mistake(error.position(), syntax(error), "see docs/sheet.md for how a sheet is written");
        }
        return toml.hasErrors() ? sheet.with(null) : read(new Keys(toml, "the sheet", sheet), sheet, sha256(bytes));
    }

    /** Some editors put a byte order mark before UTF-8. */
    private static String withoutMark(String text) {
        return text.startsWith("\uFEFF") ? text.substring(1) : text;
    }

    private static String syntax(TomlParseError error) {
        String message = String.valueOf(error.getMessage());
        return "not TOML here: " + message.replaceAll("\\s*\\(line \\d+, column \\d+\\)", "");
    }

    private static SheetReading read(Keys keys, SheetText text, String sha256) {
        String title = keys.needed("title", "\"what is measured\"");
        String item = keys.text("item", "");
        List<String> cautions = keys.texts("cautions");
        double warmUp = keys.seconds("warm_up", 0);
        ChannelsReader channels = new ChannelsReader(keys);
        RelationsReader relations = new RelationsReader(keys, channels.scope());
        List<Group> groups = relations.groups();
        RestReader rest = new RestReader(keys, channels.scope());
        BenchSheet sheet = new BenchSheet(
                title,
                item,
                cautions,
                warmUp,
                channels.channels(),
                channels.derived(),
                groups,
                rest.results(relations, groups),
                rest.joint(),
                rest.points(channels.channels()),
                rest.exclusions(),
                rest.reference(groups),
                rest.alarms(),
                rest.rule(),
                LineReader.read(
                        keys, channels.channels().stream().map(Channel::name).toList()),
                PollReader.read(keys, channels.channels()),
                RehearsalReader.read(keys, channels, relations),
                sha256);
        keys.done();
        return text.with(sheet);
    }

    private static String sha256(byte[] bytes) {
        try {
            return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("this Java has no SHA-256", e);
        }
    }
}
