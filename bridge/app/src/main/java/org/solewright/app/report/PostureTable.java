package org.solewright.app.report;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.solewright.domain.cost.Posture;
import org.solewright.domain.cost.PostureRow;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.cost.WorkForm;

/** What each posture would cost at the measured step and speed, with the lengths it stands on and their basis. */
final class PostureTable {

    private PostureTable() {}

    static Block.Table of(TransitionRow row, List<PostureRow> measured) {
        Map<Posture, List<PostureRow>> byPosture = new LinkedHashMap<>();
        measured.forEach(p ->
                byPosture.computeIfAbsent(p.posture(), k -> new ArrayList<>()).add(p));
        List<Block.Row> rows = new ArrayList<>();
        byPosture.forEach((posture, forms) -> {
            PostureRow any = forms.get(0);
            boolean isThought =
                    posture.kind() == Posture.Kind.DIGITIGRADE || posture.kind() == Posture.Kind.UNGULIGRADE;
            rows.add(Block.Row.of(
                    Words.capital(PostureCurve.words(posture)) + (isThought ? " (thought experiment)" : ""),
                    Words.number(any.limb(), 3),
                    Words.number(any.foot(), 3),
                    any.basis().word(),
                    work(forms, WorkForm.SIMULTANEOUS),
                    work(forms, WorkForm.PUSH_OFF),
                    forms.stream()
                            .filter(f -> f.workForm() == WorkForm.SIMULTANEOUS)
                            .findFirst()
                            .map(f -> Words.number(f.workPerMetre(), 1))
                            .orElse(Words.NONE)));
        });
        return new Block.Table(
                "Postures at the measured step of " + Words.number(row.number("step_length_m"), 3) + " m and "
                        + Words.number(row.number("speed_before_m_s"), 3) + " m/s",
                List.of(
                        "Posture",
                        "Limb (m)",
                        "Foot (m)",
                        "Basis of the lengths",
                        "Push-off and collision at once (J per step)",
                        "Push-off first (J per step)",
                        "At once (J per metre)"),
                rows,
                true);
    }

    private static String work(List<PostureRow> forms, WorkForm form) {
        return forms.stream()
                .filter(f -> f.workForm() == form)
                .findFirst()
                .map(f -> Words.number(f.workPerStep(), 1))
                .orElse(Words.NONE);
    }
}
