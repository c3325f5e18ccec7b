package bedmark.engine;

import java.util.Map;

/**
 * Evaluates a formula as it is printed: written from the notation alone, it shares nothing with the engine. A function
 * without brackets takes the one sign after it; powers bind closest, then signs of root and function, then products.
 */
final class Notation {
    private final String text;
    private final Map<String, Double> values;
    private int at;

    private Notation(String text, Map<String, Double> values) {
        this.text = text.replaceAll("\\s+", " ");
        this.values = values;
    }

    static double evaluate(String expression, Map<String, Double> values) {
        Notation notation = new Notation(expression, values);
        double value = notation.sum();
        notation.skip();
        if (notation.at < notation.text.length()) {
            throw new IllegalArgumentException(expression + " at " + notation.at);
        }
        return value;
    }

    private void skip() {
        while (at < text.length() && text.charAt(at) == ' ') {
            at++;
        }
    }

    private boolean take(String sign) {
        skip();
        if (text.startsWith(sign, at)) {
            at += sign.length();
            return true;
        }
        return false;
    }

    private double sum() {
        double value = product();
        while (true) {
            if (take("+")) {
                value += product();
            } else if (take("−")) {
                value -= product();
            } else {
                return value;
            }
        }
    }

    private double product() {
        double value = power();
        while (true) {
            if (take("·")) {
                value *= power();
            } else if (take("/")) {
                value /= power();
            } else {
                return value;
            }
        }
    }

    private double power() {
        if (take("−")) {
            return -power();
        }
        double value = factor();
        while (true) {
            if (take("²")) {
                value = value * value;
            } else if (take("³")) {
                value = value * value * value;
            } else {
                return value;
            }
        }
    }

    private double factor() {
        if (take("√")) {
            return Math.sqrt(factor());
        } else if (take("(")) {
            double value = sum();
            require(")");
            return value;
        }
        skip();
        int start = at;
        if (Character.isDigit(text.charAt(at))) {
            while (at < text.length() && (Character.isDigit(text.charAt(at)) || text.charAt(at) == '.')) {
                at++;
            }
            return Double.parseDouble(text.substring(start, at));
        }
        while (at < text.length() && (Character.isLetterOrDigit(text.charAt(at)) || text.charAt(at) == '′')
                && "²³".indexOf(text.charAt(at)) < 0) {
            at++;
        }
        String word = text.substring(start, at);
        return switch (word) {
            case "π" -> Math.PI;
            case "sin" -> Math.sin(factor());
            case "cos" -> Math.cos(factor());
            case "tan" -> Math.tan(factor());
            case "min", "max" -> extreme(word.equals("max"));
            default -> {
                if (!values.containsKey(word)) {
                    throw new IllegalArgumentException("'" + word + "' in " + text);
                }
                yield values.get(word);
            }
        };
    }

    private double extreme(boolean greatest) {
        require("(");
        double value = sum();
        while (take(",")) {
            double other = sum();
            value = greatest ? Math.max(value, other) : Math.min(value, other);
        }
        require(")");
        return value;
    }

    private void require(String sign) {
        if (!take(sign)) {
            throw new IllegalArgumentException(sign + " is missing in " + text + " at " + at);
        }
    }
}
