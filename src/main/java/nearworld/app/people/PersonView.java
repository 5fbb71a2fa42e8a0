package nearworld.app.people;

/**
 * A person who works with cases.
 *
 * @param id internal number
 * @param name the name to sign in with
 * @param displayName the name shown
 * @param role decides what the person may do
 */
public record PersonView(long id, String name, String displayName, Role role) implements java.io.Serializable {}
