package org.solewright.app.report;

/** What a page is written as. */
public enum PageForm {
    /** One file for a browser. */
    HTML,
    /** Paper. */
    PDF;

    /**
     * Name of a file of this form.
     *
     * @param stem without ending
     * @return with ending
     */
    public String file(String stem) {
        return stem + (this == HTML ? ".html" : ".pdf");
    }

    /**
     * The page in this form.
     *
     * @param page to be set
     * @return bytes of the file
     */
    public byte[] bytes(Page page) {
        return this == HTML ? PageWriter.html(page) : PageWriter.pdf(page);
    }
}
