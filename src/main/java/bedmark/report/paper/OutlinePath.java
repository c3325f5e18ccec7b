package bedmark.report.paper;

import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Draws a path in the notation of SVG: absolute moves, lines and quadratic curves. */
final class OutlinePath {
    private static final Pattern PART = Pattern.compile("([MLHVQZ])([^MLHVQZ]*)");
    private static final double THIRD = 1 / 3.0;

    private OutlinePath() {
    }

    static void draw(String outline, Operators operators) {
        Matcher parts = PART.matcher(outline);
        double x = 0;
        double y = 0;
        while (parts.find()) {
            double[] n = numbers(parts.group(2));
            int step = switch (parts.group(1)) {
                case "H", "V" -> 1;
                case "Q" -> 4;
                default -> 2;
            };
            if (parts.group(1).equals("Z")) {
                operators.add("h");
            }
            for (int i = 0; i + step <= n.length; i += step) {
                double fromX = x;
                double fromY = y;
                x = parts.group(1).equals("V") ? x : step == 1 ? n[i] : n[i + step - 2];
                y = parts.group(1).equals("H") ? y : n[i + step - 1];
                if (step == 4) {
                    operators.add("c", fromX + 2 * THIRD * (n[i] - fromX), fromY + 2 * THIRD * (n[i + 1] - fromY),
                            x + 2 * THIRD * (n[i] - x), y + 2 * THIRD * (n[i + 1] - y), x, y);
                } else {
                    operators.add(parts.group(1).equals("M") && i == 0 ? "m" : "l", x, y);
                }
            }
        }
    }

    private static double[] numbers(String text) {
        String plain = text.replace(',', ' ').strip();
        String[] words = plain.isEmpty() ? new String[0] : plain.split("\\s+");
        double[] numbers = new double[words.length];
        for (int i = 0; i < words.length; i++) {
            numbers[i] = Double.parseDouble(words[i]);
        }
        return numbers;
    }
}
