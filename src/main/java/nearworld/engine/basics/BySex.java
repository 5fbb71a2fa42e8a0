package nearworld.engine.basics;

/** Something that is given for each sex. */
public record BySex<T>(T male, T female) {
    public T get(Sex sex) {
        return sex == Sex.MALE ? male : female;
    }

    public static <T> BySex<T> both(T value) {
        return new BySex<>(value, value);
    }
}
