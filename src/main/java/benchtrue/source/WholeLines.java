package benchtrue.source;

import java.io.FilterInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;

/** The part of a file that ends with a line end: what a run that was killed wrote for certain. */
public final class WholeLines {
    private static final int BLOCK = 1 << 13;

    private WholeLines() {}

    /**
     * The readings of a run. Those of a live one, known by its raw.log, end with the last whole line: a number that was torn
     * when the run was killed would read as another number.
     */
    static InputStream of(Path readingsCsv) throws IOException {
        InputStream all = Files.newInputStream(readingsCsv);
        if (!Files.exists(readingsCsv.resolveSibling("raw.log"))) {
            return all;
        }
        return new Bounded(all, length(readingsCsv));
    }

    private static final class Bounded extends FilterInputStream {
        private long left;

        Bounded(InputStream in, long length) {
            super(in);
            left = length;
        }

        @Override
        public int read() throws IOException {
            byte[] one = new byte[1];
            return read(one, 0, 1) < 0 ? -1 : one[0] & 0xFF;
        }

        @Override
        public int read(byte[] into, int from, int length) throws IOException {
            if (left == 0) {
                return -1;
            }
            int count = super.read(into, from, (int) Math.min(length, left));
            left -= Math.max(0, count);
            return count;
        }
    }

    /** How many bytes from the beginning of the file, so that the last of them is a line feed; 0 where there is none. */
    public static long length(Path path) throws IOException {
        try (FileChannel channel = FileChannel.open(path, StandardOpenOption.READ)) {
            ByteBuffer block = ByteBuffer.allocate(BLOCK);
            for (long end = channel.size(); end > 0; ) {
                int size = (int) Math.min(BLOCK, end);
                block.clear().limit(size);
                while (block.hasRemaining() && channel.read(block, end - size + block.position()) >= 0) {
                    // until the block is full
                }
                for (int i = size - 1; i >= 0; i--) {
                    if (block.get(i) == '\n') {
                        return end - size + i + 1;
                    }
                }
                end -= size;
            }
            return 0;
        }
    }
}
