package org.solewright.app.pipeline;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.solewright.app.report.ModelPage;
import org.solewright.app.report.Page;
import org.solewright.app.report.PageForm;
import org.solewright.app.report.PostureCostPage;

/** The pages of results as files. */
final class ResultPages {

    private ResultPages() {}

    static Map<String, byte[]> files(AppraiseUseCase.Result result, boolean isMeasured, Set<PageForm> forms) {
        if (forms.isEmpty()) {
            return Map.of();
        }
        Page page = PostureCostPage.of(
                new PostureCostPage.Content(
                        result.cost(),
                        result.transitions(),
                        result.postures(),
                        result.contacts(),
                        List.copyOf(result.models()),
                        isMeasured),
                FindingCures.read()::of);
        return files(page, "posture-cost", forms);
    }

    /** The pages of a fit, one per side. */
    static Map<String, byte[]> files(FitUseCase.Result result, Set<PageForm> forms) {
        Map<String, byte[]> files = new LinkedHashMap<>();
        if (!forms.isEmpty()) {
            result.models()
                    .forEach((side, model) -> files.putAll(files(
                            ModelPage.of(
                                    model,
                                    Optional.ofNullable(result.rolls().get(side)),
                                    result.contacts(),
                                    FindingCures.read()::of),
                            "foot-model-" + side.word(),
                            forms)));
        }
        return files;
    }

    private static Map<String, byte[]> files(Page page, String stem, Set<PageForm> forms) {
        Map<String, byte[]> files = new LinkedHashMap<>();
        for (PageForm form : PageForm.values()) {
            if (forms.contains(form)) {
                files.put(form.file(stem), form.bytes(page));
            }
        }
        return files;
    }
}
