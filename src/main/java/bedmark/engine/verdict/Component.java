package bedmark.engine.verdict;

/** What asks for force in a loading zone. */
public enum Component {
    BED("bed"),
    SEAL("seal"),
    LOADING("loading");

    private final String code;

    Component(String code) {
        this.code = code;
    }

    public String code() {
        return code;
    }
}
