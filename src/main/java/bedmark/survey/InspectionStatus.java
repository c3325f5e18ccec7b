package bedmark.survey;

import java.util.Optional;
import java.util.stream.Stream;

/** Whether a transfer point was inspected; says nothing about its condition. */
public enum InspectionStatus {
    INSPECTED("inspected"),
    NOT_INSPECTED("not-inspected"),
    NOT_ACCESSIBLE("not-accessible"),
    NOT_APPLICABLE("not-applicable");

    private final String code;

    InspectionStatus(String code) {
        this.code = code;
    }

    /** The word used in documents. */
    public String code() {
        return code;
    }

    public static Optional<InspectionStatus> ofCode(String code) {
        return Stream.of(values()).filter(status -> status.code.equals(code)).findFirst();
    }
}
