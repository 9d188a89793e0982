package dev.leadline.desktop.style;

/// Style classes of `leadline.css`, for use in views.
public final class Styles {
    public static final String DARK = "dark";
    public static final String TITLE_ROW = "title-row";
    public static final String TITLE = "project-title";
    public static final String SENTENCE = "sentence";
    public static final String DOOR = "door";
    public static final String PANE = "pane";
    public static final String PANE_TITLE = "pane-title";
    public static final String SECTION = "section";
    public static final String QUIET = "quiet";
    public static final String FORMULA = "formula";
    public static final String FLAT_FIELD = "flat-field";
    public static final String FIELD_LABEL = "field-label";
    public static final String MESSAGE = "message";
    public static final String EXCERPT = "excerpt";
    public static final String ROW = "input-row";
    public static final String ROW_HEAD = "input-row-head";
    public static final String MATHS = "maths";
    public static final String FOLD = "fold";
    public static final String FOLD_HEAD = "fold-head";
    public static final String LINK = "link";
    public static final String RUN = "run-button";
    public static final String ANSWER_LINE = "answer-line";
    public static final String ANSWER = "answer";
    public static final String SAFETY = "safety";
    public static final String STAGE = "stage";
    public static final String STAGE_HEAD = "stage-head";
    public static final String READING = "reading";
    public static final String LANES = "lanes";
    public static final String GROUND = "ground";
    public static final String GROUND_MARK = "ground-mark";
    public static final String STATUS = "ground-status";
    public static final String START = "start-page";
    public static final String CARD = "card";

    private Styles() {}
}
