package org.solewright.app.study;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.ConcurrentMap;

/** SHA-256 of files, each read once in a run. Sizes and times of files are not trusted: clocks jump. */
final class Digests {

    private static final int BUFFER = 1 << 16;

    private final ConcurrentMap<Path, String> known = new ConcurrentHashMap<>();

    String of(Path file) {
        return known.computeIfAbsent(file, f -> {
            try {
                return sha256(f);
            } catch (IOException e) {
                return StudyTask.UNREADABLE;
            }
        });
    }

    /** Whether a file is there with these bytes. */
    static boolean matches(Path file, String sha256, long bytes) {
        try {
            return Files.isRegularFile(file)
                    && Files.size(file) == bytes
                    && sha256(file).equals(sha256);
        } catch (IOException e) {
            return false;
        }
    }

    static String sha256(Path file) throws IOException {
        MessageDigest digest = digest();
        byte[] buffer = new byte[BUFFER];
        try (InputStream in = Files.newInputStream(file)) {
            for (int n = in.read(buffer); n >= 0; n = in.read(buffer)) {
                digest.update(buffer, 0, n);
            }
        }
        return HexFormat.of().formatHex(digest.digest());
    }

    static MessageDigest digest() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java runtime has SHA-256", e);
        }
    }
}
