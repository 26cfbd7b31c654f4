package org.solewright.formats.export;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.Optional;
import org.solewright.formats.io.FormatException;

/** A stylesheet with what it may include: files of its own folder and, by their full name, ours. */
public final class Template {

    /** Largest stylesheet that is read, bytes. */
    static final int LARGEST_BYTES = 4 << 20;

    private final String source;
    private final byte[] content;
    private final Optional<Path> folder;
    private final Map<String, byte[]> library;

    private Template(String source, byte[] content, Optional<Path> folder, Map<String, byte[]> library) {
        this.source = source;
        this.content = content.clone();
        this.folder = folder;
        this.library = Map.copyOf(library);
    }

    /**
     * One of ours.
     *
     * @param name for messages
     * @param content bytes of the stylesheet
     * @param library what it may include, by full name such as {@code solewright:functions.xsl}
     * @return the template
     */
    public static Template builtIn(String name, byte[] content, Map<String, byte[]> library) {
        return new Template(name, content, Optional.empty(), library);
    }

    /**
     * The user's own.
     *
     * @param file the stylesheet; it may include files of its folder and of folders below
     * @param library what else it may include, by full name
     * @return the template
     * @throws IOException where it cannot be read
     * @throws FormatException where it is no file of that size
     */
    public static Template read(Path file, Map<String, byte[]> library) throws IOException, FormatException {
        byte[] content = bytes(file, file.toString());
        Path folder = file.toRealPath().getParent();
        return new Template(file.toString(), content, Optional.ofNullable(folder), library);
    }

    static byte[] bytes(Path file, String source) throws IOException, FormatException {
        byte[] content;
        try (InputStream in = Files.newInputStream(file)) {
            content = in.readNBytes(LARGEST_BYTES + 1);
        }
        if (content.length > LARGEST_BYTES) {
            throw new FormatException(
                    source, "the template is larger than " + LARGEST_BYTES + " bytes", "give an XSLT stylesheet");
        }
        return content;
    }

    String source() {
        return source;
    }

    byte[] content() {
        return content.clone();
    }

    Optional<Path> folder() {
        return folder;
    }

    Map<String, byte[]> library() {
        return library;
    }
}
