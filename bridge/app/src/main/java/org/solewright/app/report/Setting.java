package org.solewright.app.report;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Base64;
import java.util.List;
import java.util.Objects;

/**
 * How a page is set: its style, its scripts and the policy that lets nothing else run or load.
 *
 * @param isPdf whether it becomes paper at once: no scripts, no controls
 * @param style the style sheet
 * @param scripts in order of running
 */
public record Setting(boolean isPdf, String style, List<String> scripts) {

    /** Copies the list. */
    public Setting {
        scripts = List.copyOf(scripts);
    }

    static Setting html(boolean hasScene) {
        return new Setting(
                false,
                resource("page.css"),
                hasScene
                        ? List.of(SceneLibrary.script(), resource("page.js"), resource("scene.js"))
                        : List.of(resource("page.js")));
    }

    static Setting pdf() {
        return new Setting(true, resource("pdf.css"), List.of());
    }

    /**
     * The content policy: nothing is loaded, and only the style and scripts of this page run, known by their hashes.
     *
     * @return value of the policy
     */
    public String policy() {
        StringBuilder policy = new StringBuilder("default-src 'none'; style-src " + hash(style) + "; script-src");
        scripts.forEach(s -> policy.append(' ').append(hash(s)));
        return policy.append("; base-uri 'none'; form-action 'none'").toString();
    }

    private static String hash(String text) {
        try {
            byte[] digest = MessageDigest.getInstance("SHA-256").digest(text.getBytes(StandardCharsets.UTF_8));
            return "'sha256-" + Base64.getEncoder().encodeToString(digest) + "'";
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java has SHA-256", e);
        }
    }

    static String resource(String name) {
        return new String(bytes(name), StandardCharsets.UTF_8);
    }

    static byte[] bytes(String name) {
        try (InputStream in = Objects.requireNonNull(Setting.class.getResourceAsStream(name), name)) {
            return in.readAllBytes();
        } catch (IOException e) {
            throw new UncheckedIOException("a resource of our own cannot be read", e);
        }
    }
}
