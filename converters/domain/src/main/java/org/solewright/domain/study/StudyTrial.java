package org.solewright.domain.study;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A trial of a study.
 *
 * @param subject identifier of the subject
 * @param session identifier of the session: between two of them markers were placed anew; may be empty
 * @param name identifier of the trial within subject and session
 * @param kind what was recorded
 * @param file relative to the study's folder
 * @param condition what was on the foot
 * @param soleThickness m
 * @param walkingAid {@link #NO_AID}, else what bore part of the load
 * @param slope of the ground in the direction of walking, upwards positive, rad
 * @param beltSpeed of a treadmill's belts, m/s; 0 over ground
 * @param line of the table, from 1
 */
public record StudyTrial(
        String subject,
        String session,
        String name,
        StudyTrial.Kind kind,
        String file,
        StudyTrial.Condition condition,
        OptionalDouble soleThickness,
        String walkingAid,
        double slope,
        double beltSpeed,
        long line) {

    /** The word that says that nothing but the feet bore load. */
    public static final String NO_AID = "none";

    /** What was recorded. */
    public enum Kind {
        /** The subject stands still. */
        STANDING,
        /** The subject walks over platforms. */
        WALKING,
        /** Results of a simulation or of another program. */
        RESULTS;

        /**
         * The word used in files.
         *
         * @return such as {@code standing}
         */
        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }

        /**
         * The kind of that name.
         *
         * @param word as in files
         * @return empty where there is none
         */
        public static Optional<Kind> ofWord(String word) {
            return Arrays.stream(values()).filter(k -> k.word().equals(word)).findFirst();
        }

        /**
         * All words.
         *
         * @return in their order
         */
        public static List<String> words() {
            return Arrays.stream(values()).map(Kind::word).toList();
        }
    }

    /** What was on the foot. */
    public enum Condition {
        /** Nothing. */
        BAREFOOT,
        /** A shoe. */
        SHOD,
        /** A brace or insole that shapes the foot. */
        ORTHOSIS,
        /** An artificial foot. */
        PROSTHESIS;

        /**
         * The word used in files.
         *
         * @return such as {@code barefoot}
         */
        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }

        /**
         * The condition of that name.
         *
         * @param word as in files
         * @return empty where there is none
         */
        public static Optional<Condition> ofWord(String word) {
            return Arrays.stream(values()).filter(c -> c.word().equals(word)).findFirst();
        }

        /**
         * All words.
         *
         * @return in their order
         */
        public static List<String> words() {
            return Arrays.stream(values()).map(Condition::word).toList();
        }
    }

    /**
     * Whether something but the feet bore load.
     *
     * @return true where the forces under the feet are not all
     */
    public boolean isAided() {
        return !walkingAid.equals(NO_AID);
    }

    /**
     * Subject, session and name in one word for messages.
     *
     * @return such as {@code P07/1/walk-3}
     */
    public String id() {
        return subject + "/" + (session.isEmpty() ? "" : session + "/") + name;
    }
}
