package org.solewright.formats.c3d;

/** The machine whose numbers a file holds. */
public enum Processor {
    /** Little-endian integers, IEEE floats. */
    INTEL(84, "intel"),
    /** Little-endian integers, VAX F floats. */
    DEC(85, "dec"),
    /** Big-endian integers, IEEE floats. */
    MIPS(86, "mips");

    private final int key;
    private final String word;

    Processor(int key, String word) {
        this.key = key;
        this.word = word;
    }

    /**
     * The number that stands for it in a file.
     *
     * @return 84, 85 or 86
     */
    public int key() {
        return key;
    }

    /**
     * The word used in results.
     *
     * @return {@code intel}, {@code dec} or {@code mips}
     */
    public String word() {
        return word;
    }
}
