package org.solewright.app.pipeline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.formats.io.FormatException;

/**
 * Answers whose values follow from algebra, so that they are held where the worked answers are absent. Tolerance: a few
 * roundings of numbers near 1, wider only where a comment says so.
 */
class SolveQuestionsTest {

    private static final double ROUNDING = 1e-13;

    private static JsonNode ask(String question, String inputs) throws IOException, FormatException {
        return Asked.ask(question, inputs);
    }

    private static void is(JsonNode outputs, String name, double expected) {
        Asked.is(outputs, name, expected, ROUNDING);
    }

    @Test
    void arcWithoutRadiusIsACompass() throws IOException, FormatException {
        JsonNode o = ask("rolling.arc", "'stepLength': 0.6, 'limbLength': 0.9, 'arcRadius': 0");
        // exact: sin(alpha) = D/(2L) = 1/3; tan^2 = 1/8, sin^2(2 alpha) = 4/9 * 8/9, 2 sin^2 = 2/9.
        is(o, "/halfAngle", Math.asin(1 / 3.0));
        is(o, "/transitionAngle", 2 * Math.asin(1 / 3.0));
        is(o, "/arcLengthNeeded", 0);
        is(o, "/pushOffFactor", 1 / 8.0);
        is(o, "/noPushFactor", 32 / 81.0);
        is(o, "/simultaneousFactor", 2 / 9.0);
        // exact: (D/2L)^2 and (D/L)^2.
        is(o, "/pushOffFactorSmallAngle", 1 / 9.0);
        is(o, "/noPushFactorSmallAngle", 4 / 9.0);
    }

    @Test
    void arcOfTheLimbsRadiusIsAWheel() throws IOException, FormatException {
        JsonNode o = ask("rolling.arc", "'stepLength': 0.6, 'limbLength': 0.9, 'arcRadius': 0.9");
        // exact: D = 2 R alpha; the hip moves level, nothing is lost.
        is(o, "/halfAngle", 1 / 3.0);
        is(o, "/arcLengthNeeded", 0.6);
        for (String name :
                new String[] {"/transitionAngle", "/pushOffFactor", "/noPushFactor", "/simultaneousFactor"}) {
            is(o, name, 0);
        }
    }

    @Test
    void arcThatIsTooShortTurnsOnItsEdges() throws IOException, FormatException {
        JsonNode o =
                ask("rolling.short-arc", "'stepLength': 0.6, 'limbLength': 0.9, 'arcRadius': 0.6, 'arcHalfAngle': 0.1");
        // exact: edges at r = hypot(L - R + R cos phi, R sin phi), each chord (D - 2 R phi)/2.
        double edge = Math.hypot(0.3 + 0.6 * Math.cos(0.1), 0.6 * Math.sin(0.1));
        double sine = (0.6 - 0.12) / (2 * edge);
        assertThat(o.get("truncated").booleanValue()).isTrue();
        is(o, "/edgeRadius", edge);
        is(o, "/arcLength", 0.12);
        is(o, "/transitionAngle", 2 * Math.asin(sine));
        is(o, "/simultaneousFactor", 2 * sine * sine);
        is(o, "/pushOffFactor", sine * sine / (1 - sine * sine));
    }

    @Test
    void arcThatIsLongEnoughRollsAsIfItHadNoEnd() throws IOException, FormatException {
        String foot = "'stepLength': 0.6, 'limbLength': 0.9, 'arcRadius': 0.3";
        JsonNode whole = ask("rolling.arc", foot);
        JsonNode o = ask("rolling.short-arc", foot + ", 'arcHalfAngle': 0.8");
        assertThat(o.get("truncated").booleanValue()).isFalse();
        assertThat(o.get("edgeRadius").isNull()).isTrue();
        is(o, "/arcLength", 0.48);
        is(o, "/pushOffFactor", whole.get("pushOffFactor").doubleValue());
    }

    @Test
    void polygonOfTwoPivotsHasAnInnerAndAStepTransition() throws IOException, FormatException {
        JsonNode o = ask("rolling.polygon", "'pivots': [[-0.1, -0.9], [0.1, -0.9]], 'stepLength': 0.6");
        // exact: spacings 0.2 and 0.6 - 0.2, r^2 = 0.82; tan^2 = s^2/(4 r^2 - s^2), sin^2(delta) = q (1 - q/4), q =
        // s^2/r^2.
        double inner = 0.04 / (4 * 0.82 - 0.04);
        double last = 0.16 / (4 * 0.82 - 0.16);
        assertThat(o.at("/transitions/0/kind").asText()).isEqualTo("inner");
        assertThat(o.at("/transitions/1/kind").asText()).isEqualTo("step");
        is(o, "/transitions/0/spacing", 0.2);
        is(o, "/transitions/1/spacing", 0.4);
        is(o, "/transitions/1/radiusBefore", Math.sqrt(0.82));
        is(o, "/transitions/0/transitionAngle", 2 * Math.asin(0.1 / Math.sqrt(0.82)));
        is(o, "/transitions/0/pushOffFactor", inner);
        is(o, "/pushOffFactor", inner + last);
        double small = 0.04 / 0.82;
        double large = 0.16 / 0.82;
        is(o, "/noPushFactor", small * (1 - small / 4) + large * (1 - large / 4));
    }

    @Test
    void equivalentArcCostsWhatTheSegmentsCost() throws IOException, FormatException {
        JsonNode o = ask(
                "rolling.equivalent-arc",
                "'segments': 1, 'stepLength': 0.6, 'limbLength': 0.9, 'footLength': 0.3, 'seriesShare': 0");
        // exact: two transitions of 0.3 about 0.9, each q/(4 - q) with q = 1/9; small: 1 - sqrt(1/4 + 1/4).
        is(o, "/stepFactor", 2 / 35.0);
        is(o, "/rollingRatioSmallAngle", 1 - Math.sqrt(0.5));
        // independent: the arc's own closed form at the radius found; 1e-10 is the root's tolerance.
        double radius = 0.9 * o.get("rollingRatio").doubleValue();
        JsonNode arc = ask("rolling.arc", "'stepLength': 0.6, 'limbLength': 0.9, 'arcRadius': " + radius);
        assertThat(arc.get("pushOffFactor").doubleValue()).isCloseTo(2 / 35.0, within(1e-10));
    }

    @Test
    void circleThroughExactPointsIsFoundByEveryFit() throws IOException, FormatException {
        JsonNode o = ask("fit.circle", "'points': [[6, 2], [1, 7], [-4, 2], [4, 6]]");
        // exact: all on the circle about (1, 2) with radius 5 (3-4-5 triangle); eigenvalues cost some digits.
        for (String fit : new String[] {"unitNorm", "kasa", "pratt", "taubin", "geometric"}) {
            assertThat(o.at("/" + fit + "/centre/0").doubleValue()).as(fit).isCloseTo(1, within(1e-9));
            assertThat(o.at("/" + fit + "/centre/1").doubleValue()).as(fit).isCloseTo(2, within(1e-9));
            assertThat(o.at("/" + fit + "/radius").doubleValue()).as(fit).isCloseTo(5, within(1e-9));
        }
        is(o, "/geometric/sigma", 0);
    }

    @Test
    void circleOfThreePointsHasNoScatter() throws IOException, FormatException {
        JsonNode o = ask("fit.circle", "'points': [[6, 2], [1, 7], [-4, 2]]");
        assertThat(o.at("/geometric/sigma").asText()).isEqualTo("TOO_FEW_POINTS");
        assertThat(o.at("/geometric/covariance").asText()).isEqualTo("TOO_FEW_POINTS");
    }

    @Test
    void sphereThroughExactPointsIsFound() throws IOException, FormatException {
        JsonNode o = ask("fit.sphere", "'points': [[3, 2, 3], [-1, 2, 3], [1, 4, 3], [1, 0, 3], [1, 2, 5], [1, 2, 1]]");
        // exact: an octahedron about (1, 2, 3) with radius 2.
        is(o, "/taubin/centre/2", 3);
        is(o, "/geometric/radius", 2);
    }

    @Test
    void pivotsAreWeightedMeansOfTheirRuns() throws IOException, FormatException {
        JsonNode o = ask(
                "fit.pivots",
                "'points': [[0, 0], [0, 0.02], [0.1, 0.01], [0.1, 0.03], [0.1, 0.05]],"
                        + " 'weights': [1, 3, 1, 1, 2], 'runs': 2, 'segments': 1");
        // exact: (0 + 3 * 0.02)/4 and (0.01 + 0.03 + 2 * 0.05)/4; squares 0.0003 and 0.0011.
        is(o, "/pivots/0/1", 0.015);
        is(o, "/pivots/1/1", 0.035);
        is(o, "/sse", 0.0014);
        assertThat(o.get("cuts").toString()).isEqualTo("[0,2,5]");
        assertThat(o.get("polylineNodes").toString()).isEqualTo("[0,4]");
    }

    @Test
    void velocityUnderAVerticalForceCollidesByItsOwnSlope() throws IOException, FormatException {
        double force = 70 * 9.81;
        String sample = "[0, 0, " + force + "]";
        JsonNode o = ask(
                "collision.angles",
                "'force': [" + sample + "," + sample + "], 'velocity': [[1.2, 0, -0.5], [1.2, 0, -0.5]],"
                        + " 'timeStep': 0.1, 'mass': 70, 'gravity': 9.81");
        // exact: force = weight and straight up, so phi = theta = atan(0.5/1.2), lambda = 0; 5-12-13 triangle.
        double slope = Math.atan2(5, 12);
        is(o, "/collisionAngle", slope);
        is(o, "/forceAngle", 0);
        is(o, "/velocityAngle", slope);
        is(o, "/collisionFraction", 1);
        is(o, "/mechanicalCostOfTransport", 5 / 12.0);
        is(o, "/costFromCollisionAngle", slope * 13 / 12);
    }

    @Test
    void workIsSplitWherePowerCrossesZero() throws IOException, FormatException {
        JsonNode o = ask("power.work", "'power': [2, 2, -2], 'timeStep': 0.5");
        // exact: 2 * 0.5 and triangles of 2 * 0.25 / 2.
        is(o, "/positiveWork", 1.25);
        is(o, "/negativeWork", -0.25);
    }

    @Test
    void inventedWalkOnPointFeetKnowsItsImpulses() throws IOException, FormatException {
        JsonNode o = ask(
                "trial.synthetic",
                "'mass': 70, 'limbLength': 0.9, 'segments': 0, 'stepLength': 0.6, 'referenceSpeed': 1.25");
        // exact: compass factors 1/8, 2/9 and 32/81 times m v^2/2; the combined limbs do half of the simultaneous work.
        double kinetic = 70 * 1.25 * 1.25 / 2;
        is(o, "/radius", 0.9);
        assertThat(o.get("transitions")).hasSize(1);
        is(o, "/transitions/0/angle", 2 * Math.asin(1 / 3.0));
        is(o, "/transitions/0/impulsivePushOff", kinetic / 8);
        is(o, "/transitions/0/impulsiveSimultaneous", kinetic * 2 / 9);
        is(o, "/transitions/0/impulsiveNoPush", kinetic * 32 / 81);
        is(o, "/transitions/0/impulsiveCombined", kinetic / 9);
    }

    @ParameterizedTest
    @CsvSource({"0.3, APEX_NOT_CLEARED", "4.0, TAKE_OFF"})
    void walkThatNobodyCanTakeHasNoTruth(double speed, String code) throws IOException, FormatException {
        JsonNode o = ask(
                "trial.synthetic",
                "'mass': 70, 'limbLength': 0.9, 'segments': 0, 'stepLength': 0.6, 'referenceSpeed': " + speed);
        assertThat(o.get("error").asText()).isEqualTo(code);
        assertThat(o.get("message").asText()).contains(speed + " m/s");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "fit.circle | 'points': [[1, 2], [2, 3]] | TOO_FEW_POINTS",
                "fit.circle | 'points': [[1, 2], [2, 3, 4]] | WRONG_TYPE",
                "fit.circle | 'points': [[1, 2], 3] | WRONG_TYPE",
                "fit.circle | 'points': 'many' | WRONG_TYPE",
                "fit.circle | 'points': [[1, 2], [2, 3], [4, 4]], 'weights': [1] | WRONG_TYPE",
                "fit.circle | 'points': [[1, 2], [2, 3], [4, 4]], 'weights': [1, 1, -1] | WRONG_TYPE",
                "fit.pivots | 'points': [[1, 2], [2, 3]] | MISSING_INPUT",
                "fit.pivots | 'points': [[1, 2], [2, 3]], 'runs': 3 | TOO_FEW_POINTS",
                "fit.pivots | 'points': [[1, 2], [2, 3]], 'runs': 1.5 | WRONG_TYPE",
                "fit.pivots | 'points': [[1, 2], [2, 3]], 'segments': 2 | TOO_FEW_POINTS",
                "power.work | 'power': [1], 'timeStep': 1 | TOO_FEW_POINTS",
                "power.work | 'power': [1, true], 'timeStep': 1 | WRONG_TYPE",
                "power.work | 'power': [1, 2], 'timeStep': 0 | WRONG_TYPE",
                "collision.angles | 'force': [[0, 0, 1]], 'velocity': [[0, 0, 1], [0, 0, 1]] | WRONG_TYPE",
                "rolling.equivalent-arc | 'segments': 1, 'stepLength': 0.6, 'limbLength': 0.9, 'seriesShare': 2 | WRONG_TYPE",
            })
    void inputsThatMeanNothingAreNamed(String row) throws IOException, FormatException {
        String[] parts = row.split("\\|", -1);
        JsonNode o = ask(parts[0].strip(), parts[1]);
        assertThat(o.path("error").asText()).as(o.toString()).isEqualTo(parts[2].strip());
        assertThat(o.get("message").asText()).containsAnyOf("expected", "is not given");
    }
}
