package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.foot.RollOverMeasure;
import org.solewright.domain.foot.RollOverSheet;

/** What one foot showed, in sentences: observations, no judgement. */
final class RollOverWords {

    private RollOverWords() {}

    static List<String> of(RollOverSheet.Foot foot) {
        List<String> said = new ArrayList<>();
        foot.mean(RollOverMeasure.CONTACT_ANGLE)
                .ifPresent(v -> said.add(String.format(
                        Locale.ROOT,
                        "At contact the foot stood at %s deg to the floor, toes %s%s.",
                        text(v, 1),
                        v.value() >= 0 ? "up" : "down",
                        stances(v))));
        said.add(bore("heel", foot, RollOverMeasure.HEEL_FROM, RollOverMeasure.HEEL_TO));
        said.add(bore("metatarsal line", foot, RollOverMeasure.METATARSAL_FROM, RollOverMeasure.METATARSAL_TO));
        said.add(bore("toes", foot, RollOverMeasure.TOES_FROM, RollOverMeasure.TOES_TO));
        Optional<RollOverSheet.Value> from = foot.mean(RollOverMeasure.FLAT_FROM);
        Optional<RollOverSheet.Value> to = foot.mean(RollOverMeasure.FLAT_TO);
        said.add(
                from.isPresent() && to.isPresent()
                        ? String.format(
                                Locale.ROOT,
                                "The foot was flat from %.0f to %.0f %% of stance%s.",
                                percent(from.get()),
                                percent(to.get()),
                                stances(from.get()))
                        : foot.mean(RollOverMeasure.STANCE_TIME).isPresent()
                                ? "No foot flat was seen."
                                : "Foot flat is not known.");
        foot.mean(RollOverMeasure.HEEL_RISE)
                .ifPresent(v -> said.add(
                        String.format(Locale.ROOT, "The heel rose at %s %% of stance%s.", text(v, 1), stances(v))));
        foot.mean(RollOverMeasure.COP_PATH_SHARE)
                .ifPresent(v -> said.add(String.format(
                        Locale.ROOT,
                        "The centre of pressure travelled %s of the foot's length (%s)%s.",
                        text(v, 2),
                        v.basis().word(),
                        stances(v))));
        arc(said, foot, "shank", RollOverMeasure.SHANK_RADIUS, RollOverMeasure.SHANK_RADIUS_OVER_LIMB);
        arc(said, foot, "limb", RollOverMeasure.LIMB_RADIUS, RollOverMeasure.LIMB_RADIUS_OVER_LIMB);
        return said;
    }

    private static String bore(String place, RollOverSheet.Foot foot, RollOverMeasure from, RollOverMeasure to) {
        String name = place.substring(0, 1).toUpperCase(Locale.ROOT) + place.substring(1);
        Optional<RollOverSheet.Value> a = foot.mean(from);
        Optional<RollOverSheet.Value> b = foot.mean(to);
        long known = foot.stances().stream()
                .filter(s -> s.value(RollOverMeasure.HEEL_SHARE).isPresent())
                .count();
        if (a.isEmpty() || b.isEmpty()) {
            return known == 0
                    ? "Whether the " + place + " bore load is not known."
                    : name + " bore no load of its own in " + known + (known == 1 ? " stance." : " stances.");
        }
        return String.format(
                Locale.ROOT,
                "%s bore load %.0f-%.0f %% of stance%s.",
                name,
                percent(a.get()),
                percent(b.get()),
                a.get().n() < known ? ", in " + a.get().n() + " of " + known + " stances" : stances(a.get()));
    }

    private static void arc(
            List<String> said, RollOverSheet.Foot foot, String frame, RollOverMeasure radius, RollOverMeasure share) {
        Optional<RollOverSheet.Value> r = foot.mean(radius);
        Optional<RollOverSheet.Value> s = foot.mean(share);
        if (r.isPresent() && s.isPresent()) {
            said.add(String.format(
                    Locale.ROOT,
                    "In the %s frame it rolled on an arc of radius %s m, %s of limb length (%s)%s.",
                    frame,
                    text(r.get(), 3),
                    text(s.get(), 2),
                    s.get().basis().word(),
                    stances(r.get())));
        }
    }

    private static double percent(RollOverSheet.Value v) {
        return v.measure().inUnit(v.value());
    }

    /** Value and SD in the measure's unit. */
    static String text(RollOverSheet.Value v, int digits) {
        String value =
                String.format(Locale.ROOT, "%." + digits + "f", v.measure().inUnit(v.value()));
        return v.sd().isEmpty()
                ? value
                : value
                        + String.format(
                                Locale.ROOT,
                                " +- %." + digits + "f",
                                v.measure().inUnit(v.sd().getAsDouble()))
                        + (v.spread() == RollOverSheet.Spread.WITHIN_STANCE ? " within stance" : "");
    }

    private static String stances(RollOverSheet.Value v) {
        return v.n() == 1 ? " (1 stance)" : " (mean of " + v.n() + " stances)";
    }
}
