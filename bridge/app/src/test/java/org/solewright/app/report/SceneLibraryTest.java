package org.solewright.app.report;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class SceneLibraryTest {

    @Test
    void modulesBecomeOneScriptWithoutImports() {
        String script = SceneLibrary.script();
        assertThat(script).contains("@license", "window.THREE=", "WebGLRenderer:", "BufferGeometry:");
        assertThat(script).doesNotContain("export{", "import{", "</script");
    }
}
