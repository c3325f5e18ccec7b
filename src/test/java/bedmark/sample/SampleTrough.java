package bedmark.sample;

/**
 * The space between the boards over a trough of three equal rolls, in SI: written down once more, apart from the
 * engine, so that what lies on the demo plant's belts does not come out of what judges it.
 *
 * @param spacing    clear width between the boards (m)
 * @param centreRoll (m); the spacing on a flat belt
 * @param angle      of the wing rolls (rad)
 * @param surcharge  of the material (rad)
 */
record SampleTrough(double spacing, double centreRoll, double angle, double surcharge) {

    /** Run of each wing inside the boards (m). */
    double run() {
        return Math.max(0, (spacing - centreRoll) / (2 * Math.cos(angle)));
    }

    /** Area of a bed whose edge meets each wing at a run (m²). */
    private double areaToRun(double run) {
        double width = Math.min(centreRoll, spacing) + 2 * run * Math.cos(angle);
        return (centreRoll + run * Math.cos(angle)) * run * Math.sin(angle)
                + width * width * Math.tan(surcharge) / 6;
    }

    /** Area that lies in the trough with no depth at the boards (m²). */
    double carried() {
        return areaToRun(run());
    }

    /** Depth at the board for an area (m); negative where the bed does not reach the boards. */
    double level(double area) {
        return (area - carried()) / spacing;
    }

    /** Depth at the belt's centre for an area (m). */
    double centreDepth(double area) {
        double above = level(area);
        if (above >= 0) {
            return above + run() * Math.sin(angle) + spacing * Math.tan(surcharge) / 4;
        }
        double low = 0;
        double high = run();
        for (int i = 0; i < 60; i++) {
            double middle = (low + high) / 2;
            if (areaToRun(middle) < area) {
                low = middle;
            } else {
                high = middle;
            }
        }
        double width = centreRoll + 2 * low * Math.cos(angle);
        return low * Math.sin(angle) + width * Math.tan(surcharge) / 4;
    }
}
