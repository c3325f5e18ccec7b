package bedmark.sample;

import bedmark.quantity.Quantity;
import bedmark.quantity.Unit;

/** How a person writes readings down: the units they work in and how finely they read. */
enum SampleHand {
    METRIC {
        @Override
        Quantity depth(double si, boolean measured) {
            return measured ? SampleQuantity.decimal(si, Unit.MILLIMETRE, 0)
                    : SampleQuantity.stepped(si, Unit.MILLIMETRE, "5");
        }
    },
    CM {
        @Override
        Quantity depth(double si, boolean measured) {
            return measured ? SampleQuantity.decimal(si, Unit.CENTIMETRE, 1)
                    : SampleQuantity.stepped(si, Unit.CENTIMETRE, "0.5");
        }
    },
    US {
        @Override
        Quantity depth(double si, boolean measured) {
            return SampleQuantity.inches(si, measured ? 8 : 4);
        }

        @Override
        Quantity flow(double si) {
            return SampleQuantity.decimal(si, Unit.SHORT_TON_PER_HOUR, 0);
        }

        @Override
        Quantity speed(double si) {
            return SampleQuantity.decimal(si, Unit.FOOT_PER_MINUTE, 0);
        }
    };

    /** A depth: measured with a rule, or sighted. */
    abstract Quantity depth(double si, boolean measured);

    Quantity flow(double si) {
        return SampleQuantity.decimal(si, Unit.TONNE_PER_HOUR, si < 30 ? 1 : 0);
    }

    Quantity speed(double si) {
        return SampleQuantity.decimal(si, Unit.METRE_PER_SECOND, 2);
    }

    Quantity power(double si) {
        return SampleQuantity.decimal(si, Unit.KILOWATT, si < 100_000 ? 1 : 0);
    }
}
