package bedmark.screen.theme;

/** Our own signs, drawn as strokes on a grid of 24 × 24. */
public enum Icon {
    BACKSPACE("M9 5 H21 V19 H9 L2.5 12 Z M12 9 L18 15 M18 9 L12 15"),
    BACK("M14.5 5 L7.5 12 L14.5 19"),
    NEXT("M9.5 5 L16.5 12 L9.5 19"),
    UNDO("M9 4.5 L4 9.5 L9 14.5 M4 9.5 H14.5 A5 5 0 0 1 14.5 19.5 H9"),
    CAMERA("M3 8 H7.5 L9.5 5 H14.5 L16.5 8 H21 V19 H3 Z M15.5 13 A3.5 3.5 0 1 1 8.5 13 A3.5 3.5 0 1 1 15.5 13"),
    CHECK("M4.5 12.5 L10 18 L19.5 6.5"),
    /** A stick with an arrow onto it: what leaves the tablet. */
    EXPORT("M6 13 H18 V21 H6 Z M9.5 21 V17.5 M14.5 21 V17.5 M12 2.5 V10 M8.5 6.5 L12 10 L15.5 6.5"),
    PLUS("M12 4.5 V19.5 M4.5 12 H19.5"),
    MINUS("M4.5 12 H19.5"),
    /** To and fro over a belt. */
    SPEED("M3 9 H21 M6.5 5.5 L3 9 L6.5 12.5 M17.5 5.5 L21 9 L17.5 12.5 M3 18.5 H21"),
    CROSS("M5.5 5.5 L18.5 18.5 M18.5 5.5 L5.5 18.5"),
    /** A magnifying glass. */
    FIND("M16.5 10 A6.5 6.5 0 1 1 3.5 10 A6.5 6.5 0 1 1 16.5 10 M15 14.5 L21 20.5"),
    /** A clock: the history of a field. */
    HISTORY("M21 12 A9 9 0 1 1 3 12 A9 9 0 1 1 21 12 M12 6.5 V12.5 L16 15"),
    /** Sliders: the settings. */
    SETTINGS("M3 7 H12 M17 7 H21 M14.5 4.5 V9.5 M3 17 H7 M12 17 H21 M9.5 14.5 V19.5"),
    /** A sheet with lines and a pen's corner: actions and photos. */
    NOTES("M5 3 H16 L19.5 6.5 V21 H5 Z M8.5 9 H16 M8.5 13 H16 M8.5 17 H13"),
    /** A flag: the end of the walk. */
    FLAG("M6 21.5 V3.5 H18.5 L15.5 8 L18.5 12.5 H6"),
    LIST("M4 6 H20 M4 12 H20 M4 18 H20"),
    SUN("M16.5 12 A4.5 4.5 0 1 1 7.5 12 A4.5 4.5 0 1 1 16.5 12 M12 1.5 V4 M12 20 V22.5 M1.5 12 H4 M20 12 H22.5"
            + " M4.6 4.6 L6.4 6.4 M17.6 17.6 L19.4 19.4 M4.6 19.4 L6.4 17.6 M17.6 6.4 L19.4 4.6"),
    MOON("M19.5 14.5 A8.5 8.5 0 1 1 10 3.5 A7 7 0 0 0 19.5 14.5 Z"),
    /** A ruler: measured. */
    MEASURED("M4 17 V7 H20 V17 Z M8 7 V12 M12 7 V10.5 M16 7 V12"),
    /** A wave: estimated. */
    ESTIMATED("M3 10 C6 6 9 6 12 9.5 C15 13 18 13 21 9 M3 16 C6 12 9 12 12 15.5 C15 19 18 19 21 15"),
    /** A question: suspect. */
    SUSPECT("M7.5 8 C7.5 2 16.5 2 16.5 8 C16.5 11.5 12 11.5 12 15.5 M12 19.2 V20.4");

    private final String path;

    Icon(String path) {
        this.path = path;
    }

    /** The strokes as an SVG path. */
    public String path() {
        return path;
    }
}
