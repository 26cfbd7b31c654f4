package org.solewright.domain.motion;

/**
 * An event as a file states it.
 *
 * @param time on the recording's clock, s; frame n (as numbered in the file) is at (n - 1) / rate
 * @param context such as {@code Right}; empty where the file has none
 * @param label such as {@code Foot Strike}
 * @param source where in the file it stands
 */
public record RecordedEvent(double time, String context, String label, Source source) {

    /** Where an event stands. */
    public enum Source {
        /** EVENT parameter group. */
        GROUP("EVENT"),
        /** Header event table. */
        HEADER("header");

        private final String word;

        Source(String word) {
            this.word = word;
        }

        /**
         * The word used in files.
         *
         * @return {@code EVENT} or {@code header}
         */
        public String word() {
            return word;
        }
    }
}
