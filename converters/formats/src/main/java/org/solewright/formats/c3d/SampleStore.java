package org.solewright.formats.c3d;

import java.nio.ByteBuffer;
import java.nio.FloatBuffer;
import java.nio.IntBuffer;
import java.nio.ShortBuffer;

/**
 * Sample words as stored, reals or 16-bit integers in the host's own form, filled run by run. Half the memory of doubles;
 * what the words mean is the business of {@link C3dPoints} and {@link C3dAnalog}.
 */
abstract class SampleStore {

    /** A store for reals or for integers. */
    static SampleStore of(boolean isReal, int words) {
        return isReal ? new Reals(words) : new Integers(words);
    }

    /** Number of words. */
    abstract int words();

    /** A word; integers signed. */
    abstract float at(int index);

    /**
     * Takes a run of words from a buffer that is in the file's byte order.
     *
     * @param chunk words from offset 0
     * @param from first word in the chunk
     * @param to first word in the store
     * @param count of words
     * @param isVax whether reals are VAX F
     */
    abstract void put(ByteBuffer chunk, int from, int to, int count, boolean isVax);

    private static final class Reals extends SampleStore {
        private final float[] words;

        Reals(int words) {
            this.words = new float[words];
        }

        @Override
        int words() {
            return words.length;
        }

        @Override
        float at(int index) {
            return words[index];
        }

        @Override
        void put(ByteBuffer chunk, int from, int to, int count, boolean isVax) {
            if (isVax) {
                IntBuffer bits = chunk.asIntBuffer();
                for (int i = 0; i < count; i++) {
                    words[to + i] = VaxFloat.of(bits.get(from + i));
                }
            } else {
                FloatBuffer reals = chunk.asFloatBuffer();
                reals.get(from, words, to, count);
            }
        }
    }

    private static final class Integers extends SampleStore {
        private final short[] words;

        Integers(int words) {
            this.words = new short[words];
        }

        @Override
        int words() {
            return words.length;
        }

        @Override
        float at(int index) {
            return words[index];
        }

        @Override
        void put(ByteBuffer chunk, int from, int to, int count, boolean isVax) {
            ShortBuffer integers = chunk.asShortBuffer();
            integers.get(from, words, to, count);
        }
    }
}
