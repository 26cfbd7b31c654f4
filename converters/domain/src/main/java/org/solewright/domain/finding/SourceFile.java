package org.solewright.domain.finding;

/**
 * An input that a result was computed from.
 *
 * @param role what it was used as, such as {@code standing}, {@code walking} or {@code landmarks}
 * @param path the file's name without folder, so that results do not depend on where the file lay
 * @param sha256 SHA-256 of its bytes, 64 lower-case hexadecimal digits
 */
public record SourceFile(String role, String path, String sha256) {

    private static final int DIGITS = 64;

    /** Checks that role and name say something and that the digest is one. */
    public SourceFile {
        if (role.isBlank() || path.isBlank()) {
            throw new IllegalArgumentException("source file without role or name: role '" + role + "'");
        }
        if (sha256.length() != DIGITS || !sha256.chars().allMatch(SourceFile::isHexadecimal)) {
            throw new IllegalArgumentException("SHA-256 '" + sha256 + "', expected 64 lower-case hexadecimal digits");
        }
    }

    private static boolean isHexadecimal(int c) {
        return (c >= '0' && c <= '9') || (c >= 'a' && c <= 'f');
    }
}
