package org.solewright.app.pipeline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.solewright.app.pipeline.Asked.ask;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.formats.io.FormatException;

/**
 * Questions about vaults, walkers, impacts, sprawled limbs and the cost index, on inputs whose answers follow from
 * algebra or a publication. Tolerance: roundings of closed forms (1e-12), a root's or an integrator's tolerance where a
 * comment says so.
 */
class MotionQuestionsTest {

    private static final double ROUNDING = 1e-12;
    private static final String COMPASS = "'segments': 0, 'stepLength': 0.6, 'limbLength': 0.9, 'gravity': 9.81";

    private static void is(JsonNode outputs, String name, double expected) {
        Asked.is(outputs, name, expected, ROUNDING);
    }

    @Test
    void vaultKeepsItsEnergyAndTakesTheTimeOfItsQuadrature() throws IOException, FormatException {
        JsonNode o = ask(
                "vault.duration",
                "'radius': 0.9, 'startLean': -0.3, 'endLean': 0.4, 'startRate': 1.6, 'gravity': 9.81");
        // exact: omega^2 = omega0^2 + (2 g/r)(cos theta0 - cos theta).
        is(o, "/endRate", rate(0.4));
        // independent: Simpson's rule for the integral of d theta/omega; 2000 panels leave an error far under 1e-11.
        int panels = 2000;
        double sum = 1 / rate(-0.3) + 1 / rate(0.4);
        for (int i = 1; i < panels; i++) {
            sum += (i % 2 == 1 ? 4 : 2) / rate(-0.3 + 0.7 * i / panels);
        }
        Asked.is(o, "/duration", sum * 0.7 / panels / 3, 1e-11);
    }

    private static double rate(double lean) {
        return Math.sqrt(1.6 * 1.6 + 2 * 9.81 / 0.9 * (Math.cos(0.3) - Math.cos(lean)));
    }

    @Test
    void levelCompassPushesWhatItLosesAtTheMeanSpeedAsked() throws IOException, FormatException {
        JsonNode o = ask("vault.level-gait", COMPASS + ", 'meanSpeed': 1.2, 'mass': 70");
        // exact: sin(beta) = 1/3, tan^2(beta) = 1/8; mean speed D/T. 1e-10 is the root's tolerance.
        double start = o.get("startSpeed").doubleValue();
        Asked.is(o, "/stepTime", 0.5, 1e-10);
        is(o, "/pushOffWork", 70 * start * start / 16);
        is(o, "/collisionLoss", 70 * start * start / 16);
        is(o, "/transitions/0/angle", 2 * Math.asin(1 / 3.0));
        is(o, "/transitions/0/pushImpulse", start / Math.sqrt(8));
        is(o, "/quasiSteadyPushOffWork", 70 * 1.44 / 16);
        // exact: least speed just clears the apex, greatest just keeps the foot loaded at the lean's ends.
        double cosine = Math.sqrt(8) / 3;
        Asked.is(o, "/startSpeedLimits/0", Math.sqrt(2 * 9.81 * 0.9 * (1 - cosine)), 1e-10);
        Asked.is(o, "/startSpeedLimits/1", Math.sqrt(9.81 * 0.9 * cosine), 1e-10);
    }

    @Test
    void speedWindowOfACompassIsThatOfItsLean() throws IOException, FormatException {
        JsonNode o = ask("vault.speed-window", COMPASS);
        // exact: as above; v^2/(g r) = cos(beta).
        double cosine = Math.sqrt(8) / 3;
        Asked.is(o, "/leastStartSpeed", Math.sqrt(2 * 9.81 * 0.9 * (1 - cosine)), 1e-10);
        Asked.is(o, "/greatestStartSpeed", Math.sqrt(9.81 * 0.9 * cosine), 1e-10);
        Asked.is(o, "/greatestFroude", cosine, 1e-10);
    }

    @Test
    void passiveCompassLosesWhatTheSlopeGives() throws IOException, FormatException {
        JsonNode o = ask("vault.passive-gait", COMPASS + ", 'slope': 0.05");
        // exact: loss g D sin(gamma); eigenvalue cos^2(2 beta) = (7/9)^2.
        is(o, "/lossPerMass", 9.81 * 0.6 * Math.sin(0.05));
        is(o, "/gravityWorkPerMass", 9.81 * 0.6 * Math.sin(0.05));
        is(o, "/eigenvalue", 49 / 81.0);
        double before = o.at("/speedBefore/0").doubleValue();
        is(o, "/startSpeed", before * 7 / 9);
    }

    @Test
    void polygonOfOnePivotIsTheCompassAgain() throws IOException, FormatException {
        JsonNode o = ask(
                "vault.polygon-step",
                "'pivots': [[0, -0.9]], 'stepLength': 0.6, 'startSpeed': 1.3, 'mass': 70, 'gravity': 9.81");
        // exact: level, pushed at every transition: the start speed comes back; work m v^2 tan^2(beta)/2.
        is(o, "/endSpeed", 1.3);
        is(o, "/pushOffWork", 70 * 1.69 / 16);
        JsonNode passive = ask(
                "vault.polygon-step",
                "'pivots': [[0, -0.9]], 'stepLength': 0.6, 'startSpeed': 1.3, 'mass': 70, 'gravity': 9.81,"
                        + " 'pushOffPolicy': 'none'");
        // exact: v+ = v- cos(2 beta), loss m v^2 sin^2(2 beta)/2 with sin^2 = 32/81.
        is(passive, "/endSpeed", 1.3 * 7 / 9);
        is(passive, "/pushOffWork", 0);
        is(passive, "/transitions/0/collisionLoss", 70 * 1.69 / 2 * 32 / 81);
    }

    @Test
    void rimlessWheelKeepsTwoThirdsOfItsRate() throws IOException, FormatException {
        JsonNode o = ask(
                "vault.rimless-wheel",
                "'spokes': 6, 'slope': 0.2, 'inertiaRatio': 0.6666666666666666, 'spokeLength': 1, 'gravity': 9.81");
        // exact (McGeer 1990): mu = 1 + lambda^2 (cos(2 pi/6) - 1) = 2/3.
        is(o, "/rateRatio", 2 / 3.0);
        is(o, "/eigenvalue", 4 / 9.0);
        double before = Math.sqrt(4 * 2 / 3.0 * 9.81 * 0.5 * Math.sin(0.2) / (1 - 4 / 9.0));
        is(o, "/rateBefore", before);
        is(o, "/rateAfter", before * 2 / 3);
        assertThat(o.get("clearsApex").booleanValue()).isTrue();
    }

    @ParameterizedTest
    // independent: fixed points by 30-digit arithmetic, as design 04 E6 gives them; 1e-9 and 1e-7 are its tolerances.
    @CsvSource({
        "long, 0.200310900544247, 0.199832473004952, 3.88246375285137, -0.190099841065886",
        "short, 0.193937369810182, 0.203866927442007, 3.09610586807816, 0.459589589797677"
    })
    void simplestWalkerHasItsTwoGaits(String gait, double angle, double rate, double time, double eigenvalue)
            throws IOException, FormatException {
        JsonNode o = ask("walker.passive", "'slope': 0.009, 'gait': '" + gait + "'");
        Asked.is(o, "/halfAngle", angle, 1e-9);
        Asked.is(o, "/stanceRate", rate, 1e-9);
        Asked.is(o, "/stepTime", time, 1e-9);
        Asked.is(o, "/eigenvalues/0/0", eigenvalue, 1e-7);
        // exact: on a slope the loss of a step is D sin(gamma) in units of m g L.
        Asked.is(o, "/collisionLoss", o.get("stepLength").doubleValue() * Math.sin(0.009), 1e-9);
    }

    @Test
    void poweredWalkerPushesWhatItLoses() throws IOException, FormatException {
        JsonNode o = ask("walker.powered", "'halfAngle': 0.3");
        // exact (design 04 E4): level, P = v tan(alpha), work P^2/2 = loss. 1e-9 is the fixed point's tolerance.
        double push = o.get("speedBefore").doubleValue() * Math.tan(0.3);
        Asked.is(o, "/pushImpulse", push, 1e-9);
        Asked.is(o, "/pushOffWork", push * push / 2, 1e-9);
        Asked.is(o, "/collisionLoss", push * push / 2, 1e-9);
        JsonNode target = ask("walker.target", "'speed': 0.4, 'stepLength': 0.7");
        // independent: design 04 E6, ten digits; time D/v.
        Asked.is(target, "/hipStiffness", 2.476617941, 1e-8);
        Asked.is(target, "/pushImpulse", 0.1893646200, 1e-8);
        Asked.is(target, "/stepTime", 0.7 / 0.4, 1e-9);
    }

    @Test
    void walkerLosesItsOneStepRhythmAtTheSlopeThatIsKnown() throws IOException, FormatException {
        // independent: design 04 E6, seven digits (published: stable below 0.015).
        Asked.is(ask("walker.period-doubling", ""), "/slope", 0.01508844, 5e-9);
    }

    @Test
    void rodThatLandsOnOneEndKeepsThreeQuartersOfItsEnergy() throws IOException, FormatException {
        String rod = "'hipMass': 0, 'segments': [{'parent': -1, 'length': 1, 'mass': 2, 'com': 0.5,"
                + " 'inertia': 0.16666666666666666, 'angle': 1.5707963267948966}], 'hipVelocity': [0, -1]";
        JsonNode o = ask("impact.chain", rod + ", 'constraints': [{'segment': 0, 'distance': 1}]");
        // exact: momentum about the end that stops: m v L/2 = (m L^2/3) omega, omega = 3 v/(2 L); energies 1 and 3/4.
        is(o, "/rates/0", 1.5);
        is(o, "/hipVelocity/1", -1.5);
        is(o, "/loss", 0.25);
        is(o, "/energyBefore", 1);
        is(o, "/energyAfter", 0.75);
        JsonNode twice = ask(
                "impact.chain",
                rod + ", 'constraints': [{'segment': 0, 'distance': 1}, {'segment': 0, 'distance': 1}]");
        assertThat(twice.get("error").asText()).isEqualTo("REDUNDANT_CONSTRAINTS");
        JsonNode normal =
                ask("impact.chain", rod + ", 'constraints': [{'segment': 0, 'distance': 1, 'direction': [0, 1]}]");
        // exact: nothing moves sideways, so that the tangential row does nothing.
        is(normal, "/loss", 0.25);
        JsonNode hip = ask("impact.chain", rod + ", 'constraints': [{'segment': -1, 'distance': 0}]");
        // exact: by symmetry the other end loses as much.
        is(hip, "/loss", 0.25);
        is(hip, "/rates/0", -1.5);
    }

    @Test
    void lockedKneeOfAFreePairKeepsTheirMeanRate() throws IOException, FormatException {
        String half = "'length': 0, 'mass': 0, 'com': 0, 'inertia': 0.5, 'angle': 0";
        JsonNode o = ask(
                "impact.chain",
                "'hipMass': 3, 'hipVelocity': [0, 0], 'segments': [{'parent': -1, 'rate': 2, " + half
                        + "}, {'parent': 0, 'rate': 0, " + half + "}], 'constraints': [{'lock': [0, 1]}]");
        // exact: two equal flywheels coupled: rate 1 each, loss I (2/2)^2 = half of I 2^2/2.
        is(o, "/rates/0", 1);
        is(o, "/rates/1", 1);
        is(o, "/loss", 0.5);
    }

    @Test
    void sphereOnACircleRollsOnASmallCircle() throws IOException, FormatException {
        JsonNode o = ask("sprawl.circle", "'trackRadius': 0.12, 'sphereRadius': 0.12, 'turnAngle': 1");
        // exact: tan(psi) = c/r = 1; arc c over the small circle's radius r sin(psi).
        is(o, "/circleAngle", Math.PI / 4);
        is(o, "/sphereArcAngle", Math.sqrt(2));
    }

    @Test
    void sprawledKneeFollowsItsTrochoid() throws IOException, FormatException {
        JsonNode o = ask(
                "sprawl.trochoid",
                "'femurLength': 0.5, 'hipHeight': 0.4, 'sphereRadius': 0.1, 'forwardSpeed': 0.8,"
                        + " 'protraction': 0.5, 'stanceTime': 1");
        // exact: rho = 0.4 (3-4-5), rate 1 rad/s, lambda = 0.4/0.8; curvature rho w^2 (rho w - V)/(V - rho w)^3.
        is(o, "/planarRadius", 0.4);
        is(o, "/rateRatio", 0.5);
        is(o, "/netAdvance", 0.8 - 0.8 * Math.sin(0.5));
        is(o, "/kneeX/2", 0.4 - 0.4 * Math.sin(0.5));
        is(o, "/kneeY/0", 0.4 * Math.cos(0.5));
        is(o, "/kneeY/2", 0.4);
        is(o, "/trackCurvature/2", -2.5);
        JsonNode cusp = ask(
                "sprawl.trochoid",
                "'femurLength': 0.5, 'hipHeight': 0.4, 'sphereRadius': 0.1, 'forwardSpeed': 0.4,"
                        + " 'protraction': 0.5, 'stanceTime': 1");
        // exact: lambda = 1 has a cusp at mid-stance.
        assertThat(cusp.at("/trackCurvature/2").asText()).isEqualTo("NO_SOLUTION");
    }

    @Test
    void costRatesAreTheirFormulas() throws IOException, FormatException {
        String asked = "'stepLength': 0.6, 'speed': 1.2, 'limbLength': 0.9, 'mass': 70, 'gravity': 10, 'workCost': 4,"
                + " 'activationCost': 0.002, 'foot': {'kind': 'given', 'segments': 0}";
        JsonNode o = ask("cost.rates", asked + ", 'swingCost': 0.1");
        // exact: f = 2/s, k = 1/8, sqrt(g L) = 3, phi = 0.6, D/L = 2/3.
        is(o, "/workRate", 70 * 4 / 8.0 * 0.72 * 2);
        is(o, "/swingRate", 70 * 0.1 * 10 * 3 * 2 / 3 * Math.pow(0.6, 4));
        is(o, "/activationRate", 70 * 0.002 * 10 * 0.9 * 2);
        JsonNode pendulum = ask("cost.rates", asked + ", 'pendulumSwingCost': 0.1, 'naturalFrequency': 0.5");
        // exact: phi^2 (phi^2 - phi_n^2) instead of phi^4.
        is(pendulum, "/swingRate", 70 * 0.1 * 10 * 3 * 2 / 3 * 0.36 * (0.36 - 0.25));
    }

    @Test
    void costIndexIsCalibratedWhereItSays() throws IOException, FormatException {
        JsonNode o = ask(
                "cost.calibration",
                "'reference': {'rollingRatio': 0.3, 'limbLength': 0.9, 'stepLength': 0.72, 'speed': 1.25},"
                        + " 'gravity': 9.81");
        // independent: design 04 B, ten digits.
        Asked.is(o, "/swingCost", 0.1068573202, 1e-10);
        is(o, "/activationCost", 0);
        String rolling = "'limbLength': 0.9, 'foot': {'kind': 'rolling', 'rollingRatio': 0.3}, 'gravity': 9.81,"
                + " 'activationCost': 0, 'swingCost': 0.10685732017774674";
        // independent: the step of the calibration is the optimum again; 1e-6 is the search's.
        Asked.is(ask("cost.optimum", rolling + ", 'speed': 1.25"), "/optimumStepLength", 0.72, 1e-6);
        JsonNode bySpeed = ask(
                "cost.optimum-by-speed",
                "'limbLength': 0.9, 'foot': {'kind': 'rolling', 'rollingRatio': 0.3}, 'gravity': 9.81,"
                        + " 'activationCost': 0, 'pendulumSwingCost': 0.1305038207, 'naturalFrequency': 0.3877008210018449,"
                        + " 'mass': 70, 'speeds': [0.8, 1.8]");
        // independent: design 04 B, pendulum form, four digits.
        Asked.is(bySpeed, "/0/optimumStepLength", 0.6237, 5e-5);
        Asked.is(bySpeed, "/1/optimumStepLength", 0.7932, 5e-5);
        is(bySpeed, "/1/costOfTransport", bySpeed.at("/1/rate").doubleValue() / (70 * 9.81 * 1.8));
        JsonNode usual = ask("cost.optimum-by-speed", rolling + ", 'mass': 70");
        assertThat(usual).hasSize(6);
    }

    @Test
    void slidingFootLosesFrictionTimesSpeedAndARollingOneNothing() throws IOException, FormatException {
        JsonNode sliding = ask(
                "power.distal",
                "'force': [-30, 0, 100], 'freeMoment': [0, 0, 0], 'comVelocity': [0.2, 0, 0],"
                        + " 'angularVelocity': [0, 0, 0], 'com': [0, 0, 0.05], 'cop': [0.1, 0, 0]");
        // exact: -mu N v with mu = 0.3.
        is(sliding, "/power", -6);
        JsonNode rolling = ask(
                "power.distal",
                "'force': [-30, 0, 100], 'freeMoment': [0, 0, 0], 'comVelocity': [0.1, 0, -0.2],"
                        + " 'angularVelocity': [0, 2, 0], 'com': [0.1, 0, 0.05], 'cop': [0, 0, 0]");
        // exact: v = omega x (com - cop), the point at the COP rests.
        is(rolling, "/power", 0);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "vault.duration | 'radius': 0.9, 'startLean': -0.3, 'endLean': 0.4, 'startRate': 0.5 | APEX_NOT_CLEARED",
                "vault.level-gait | 'segments': 0, 'stepLength': 0.6, 'limbLength': 0.9, 'meanSpeed': 9, 'mass': 70 | TAKE_OFF",
                "vault.level-gait | 'segments': 0, 'stepLength': 0.6, 'limbLength': 0.9, 'meanSpeed': 1, 'mass': 0 | WRONG_TYPE",
                "vault.level-gait | 'segments': 0, 'stepLength': 2, 'limbLength': 0.9, 'meanSpeed': 1, 'mass': 70 | PIVOT_SPACING_OUT_OF_REACH",
                "vault.polygon-step | 'pivots': [[0, -0.9]], 'stepLength': 0.6, 'startSpeed': 0, 'mass': 70 | WRONG_TYPE",
                "walker.passive | 'slope': 0.009, 'gait': 'middle' | WRONG_TYPE",
                "walker.target | 'speed': -1, 'stepLength': 0.7 | WRONG_TYPE",
                "impact.chain | 'hipMass': 1, 'segments': [], 'hipVelocity': [0], 'constraints': [] | WRONG_TYPE",
                "impact.chain | 'hipMass': 1, 'segments': [], 'hipVelocity': [0, 0], 'constraints': [{'lock': [0, 1]}] | WRONG_TYPE",
                "impact.chain | 'hipMass': 1, 'segments': [], 'hipVelocity': [0, 0], 'constraints': [{'segment': -1, 'distance': 0, 'direction': [1]}] | WRONG_TYPE",
                "sprawl.trochoid | 'femurLength': 0.2, 'hipHeight': 0.4, 'sphereRadius': 0.1, 'forwardSpeed': 0.8, 'protraction': 0.5, 'stanceTime': 1 | FEMUR_TOO_SHORT",
                "sprawl.trochoid | 'femurLength': 0.5, 'hipHeight': 0.4, 'sphereRadius': 0.1, 'forwardSpeed': 0.8, 'protraction': -0.5, 'stanceTime': 1 | WRONG_TYPE",
                "cost.rates | 'stepLength': 0.6, 'speed': 1.2, 'limbLength': 0.9, 'mass': 70, 'foot': {'kind': 'round', 'segments': 1} | WRONG_TYPE",
                "cost.calibration | 'activationShare': 1, 'reference': {'rollingRatio': 0.3, 'limbLength': 0.9, 'stepLength': 0.72, 'speed': 1.25} | WRONG_TYPE",
                "cost.optimum-by-speed | 'mass': 70, 'limbLength': 0.9, 'foot': {'kind': 'rolling', 'rollingRatio': 0.3}, 'speeds': [1, -1] | WRONG_TYPE",
            })
    void inputsOutOfRangeAreNamed(String row) throws IOException, FormatException {
        String[] parts = row.split("\\|", -1);
        JsonNode o = ask(parts[0].strip(), parts[1]);
        assertThat(o.path("error").asText()).as(o.toString()).isEqualTo(parts[2].strip());
        assertThat(o.get("message").asText()).containsAnyOf("expected", "is not given");
    }
}
