package nearworld.engine.basics;

/** The sex that a table's rates and a pack's prevalences are given for. Whether it may be used is local law's to say. */
public enum Sex {
    MALE,
    FEMALE
}
