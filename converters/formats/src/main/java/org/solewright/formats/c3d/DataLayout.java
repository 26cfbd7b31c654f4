package org.solewright.formats.c3d;

/**
 * Where the samples of a file lie.
 *
 * @param start offset of the first frame, bytes
 * @param frames number of whole frames
 * @param points points per frame
 * @param channels analog channels
 * @param analogPerFrame analog samples per frame and channel
 * @param isReal whether samples are reals of 4 bytes, else integers of 2
 */
record DataLayout(int start, int frames, int points, int channels, int analogPerFrame, boolean isReal) {

    int wordBytes() {
        return isReal ? 4 : 2;
    }

    int pointBytes() {
        return 4 * points * wordBytes();
    }

    long frameBytes() {
        return pointBytes() + (long) channels * analogPerFrame * wordBytes();
    }

    int frameOffset(int frame) {
        return (int) (start + frame * frameBytes());
    }

    DataLayout withFrames(int count) {
        return new DataLayout(start, count, points, channels, analogPerFrame, isReal);
    }
}
