package bedmark.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import bedmark.quantity.TypedNumber.Accepted;
import bedmark.quantity.TypedNumber.Reason;
import bedmark.quantity.TypedNumber.Rejected;
import java.math.BigDecimal;
import java.util.Locale;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NumberEntryTest {
    private static final NumberEntry ENGLISH = new NumberEntry(Locale.UK);
    private static final NumberEntry SPANISH = new NumberEntry(Locale.forLanguageTag("es-ES"));

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "9.50 | 9.50", "0 | 0", ".5 | 0.5", "5. | 5", "-1.25 | -1.25", "−3 | -3", "007 | 7", "~  12.0  ~ | 12.0"})
    void decimalsKeepTheirDigits(String typed, String value) {
        assertEquals(new Accepted(new BigDecimal(value), Optional.empty()), ENGLISH.read(typed));
        assertEquals(new Accepted(new BigDecimal(value), Optional.empty()), SPANISH.read(typed));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "9 1/2 | 9.5", "9-1/2 | 9.5", "9½ | 9.5", "9 ½ | 9.5", "1/4 | 0.25", "½ | 0.5", "3 7/64 | 3.109375",
        "19/2 | 9.5", "9–1/2 | 9.5", "9 1⁄2 | 9.5", "9  1/2 | 9.5", "9 1 / 2 | 9.5", "-2 1/2 | -2.5", "2/1 | 2",
        "0 3/8 | 0.375", "9 1/2 | 9.5", "1 3/5 | 1.6"})
    void fractionsAreConvertedExactlyAndRemembered(String typed, String value) {
        assertEquals(new Accepted(new BigDecimal(value), Optional.of(typed)), ENGLISH.read(typed));
        assertEquals(new Accepted(new BigDecimal(value), Optional.of(typed)), SPANISH.read(typed));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "9 1/2\" | 9.5 | 9 1/2\"", "9-1/2\" | 9.5 | 9-1/2\"", "9½″ | 9.5 | 9½″", "12\" | 12 |", "9.5 \" | 9.5 |"})
    void inchMarksFollowInches(String typed, String value, String entered) {
        assertEquals(new Accepted(new BigDecimal(value), Optional.ofNullable(entered)),
                ENGLISH.read(typed, Unit.INCH));
        assertEquals(new Rejected(Reason.INCH_MARK), ENGLISH.read(typed, Unit.MILLIMETRE));
        assertEquals(new Rejected(Reason.INCH_MARK), ENGLISH.read(typed));
    }

    @ParameterizedTest
    @CsvSource({"'9,5', 9.5", "'0,250', 0.250", "',5', 0.5", "'-1,5', -1.5"})
    void decimalCommaIsReadWhereTheLocaleWritesIt(String typed, String value) {
        assertEquals(new Accepted(new BigDecimal(value), Optional.empty()), SPANISH.read(typed));
        assertEquals(new Rejected(Reason.COMMA), ENGLISH.read(typed));
    }

    @ParameterizedTest
    @CsvSource({"'1.234,5'", "'1,234.5'", "1.2.3", "'1,2,3'", "..5", "5.."})
    void secondDecimalSignIsNeverReinterpreted(String typed) {
        assertEquals(new Rejected(Reason.SECOND_DECIMAL_SIGN), SPANISH.read(typed));
        assertEquals(new Rejected(Reason.SECOND_DECIMAL_SIGN), ENGLISH.read(typed));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "~~ | EMPTY", "~  ~ | EMPTY", "- | UNFINISHED", ". | UNFINISHED", "-. | UNFINISHED", "9- | UNFINISHED",
        "9 1 | UNFINISHED", "9 1/ | UNFINISHED", "1/ | UNFINISHED", "1e3 | EXPONENT", "1E | EXPONENT",
        "2.5e-3 | EXPONENT", "12mm | FOREIGN_SIGN", "abc | FOREIGN_SIGN", "1+1 | FOREIGN_SIGN", "+5 | FOREIGN_SIGN",
        "٣ | FOREIGN_SIGN", "NaN | FOREIGN_SIGN", "5' | FOREIGN_SIGN", "1'000 | FOREIGN_SIGN",
        "1/0 | FRACTION", "9 3/2 | FRACTION", "9.5 1/2 | FRACTION", "9 1/2 3 | FRACTION", "1/2/3 | FRACTION",
        "/2 | FRACTION", "9 1/2.5 | FRACTION", "1/3 | ENDLESS_FRACTION", "⅔ | ENDLESS_FRACTION",
        "2 5/7 | ENDLESS_FRACTION", "1 2 3 | SPACE", "12 000.5 | SPACE",
        "1234567890123456789012345 | TOO_LONG"})
    void whatIsNoNumberSaysWhy(String typed, Reason reason) {
        assertEquals(new Rejected(reason), ENGLISH.read(typed));
    }

    @Test
    void everySixtyFourthOfAnInchIsExact() {
        for (int denominator = 2; denominator <= 64; denominator *= 2) {
            for (int numerator = 1; numerator < denominator; numerator++) {
                Accepted read = assertInstanceOf(Accepted.class,
                        ENGLISH.read("7 " + numerator + "/" + denominator, Unit.INCH));
                assertEquals(0, read.value().multiply(BigDecimal.valueOf(denominator))
                        .compareTo(BigDecimal.valueOf(7L * denominator + numerator)));
            }
        }
    }

    @Test
    void whateverIsTypedGivesANumberOrAReason() {
        String signs = "0123456789.,-/ \"½eE¾x";
        Random random = new Random(20260301);
        for (int i = 0; i < 20_000; i++) {
            StringBuilder typed = new StringBuilder();
            for (int k = random.nextInt(9); k > 0; k--) {
                typed.append(signs.charAt(random.nextInt(signs.length())));
            }
            if (SPANISH.read(typed.toString(), Unit.INCH) instanceof Accepted accepted) {
                long commasAndPoints = typed.chars().filter(sign -> sign == '.' || sign == ',').count();
                assertEquals(true, commasAndPoints <= 1, typed.toString());
                assertEquals(accepted, SPANISH.read(typed.toString(), Unit.INCH));
            }
        }
    }

    @Test
    void acceptedNumberBecomesAQuantity() {
        Accepted read = assertInstanceOf(Accepted.class, ENGLISH.read("9 1/2", Unit.INCH));
        assertEquals(Quantity.of("9.5", Unit.INCH).enteredAs("9 1/2"), read.in(Unit.INCH));
    }
}
