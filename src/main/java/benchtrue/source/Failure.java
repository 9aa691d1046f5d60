package benchtrue.source;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.FileSystemException;
import java.nio.file.NoSuchFileException;

/** Why a file could not be read or written, in words. */
public final class Failure {
    private Failure() {}

    public static String words(IOException e) {
        if (e instanceof NoSuchFileException) {
            return "there is no such file or folder";
        }
        if (e instanceof AccessDeniedException) {
            return "no permission";
        }
        if (e instanceof FileAlreadyExistsException) {
            return "there is a file of this name already";
        }
        String reason = e instanceof FileSystemException f ? f.getReason() : e.getMessage();
        return reason == null ? e.getClass().getSimpleName() : reason;
    }
}
