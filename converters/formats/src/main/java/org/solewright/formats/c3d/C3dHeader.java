package org.solewright.formats.c3d;

import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.io.FormatException;

/**
 * The header block, words as stored.
 *
 * @param parameterBlock first block of the parameters, 1-based
 * @param points points per frame
 * @param analogWords analog words per frame
 * @param firstFrame number of the first frame
 * @param lastFrame number of the last frame, as stored in 16 bits
 * @param scale negative where samples are reals
 * @param dataBlock first block of the data, 1-based
 * @param analogPerFrame analog samples per frame
 * @param rate frames per second, Hz
 * @param events events of the header
 */
record C3dHeader(
        int parameterBlock,
        int points,
        int analogWords,
        int firstFrame,
        int lastFrame,
        float scale,
        int dataBlock,
        int analogPerFrame,
        float rate,
        List<RecordedEvent> events) {

    static final int BYTES = 512;
    static final int EVENT_COUNT = 300;
    static final int EVENT_TIMES = 304;
    static final int EVENT_FLAGS = 376;
    static final int EVENT_LABELS = 396;
    private static final int MOST_EVENTS = 18;

    static C3dHeader read(ByteCursor c) throws FormatException {
        return new C3dHeader(
                c.u8(0), c.u16(2), c.u16(4), c.u16(6), c.u16(8), c.f32(12), c.u16(16), c.u16(18), c.f32(20), events(c));
    }

    private static List<RecordedEvent> events(ByteCursor c) throws FormatException {
        List<RecordedEvent> events = new ArrayList<>();
        int count = c.u16(EVENT_COUNT);
        if (count > MOST_EVENTS) {
            return events;
        }
        for (int k = 0; k < count; k++) {
            float time = c.f32(EVENT_TIMES + 4 * k);
            String label = c.text(EVENT_LABELS + 4 * k, 4).trim();
            if (Float.isFinite(time)) {
                events.add(new RecordedEvent(time, "", label, RecordedEvent.Source.HEADER));
            }
        }
        return events;
    }
}
