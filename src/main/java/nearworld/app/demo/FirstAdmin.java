package nearworld.app.demo;

import nearworld.app.people.People;
import nearworld.app.people.Role;
import nearworld.app.trail.NewEntry;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;

/** The first admin of an empty installation, named on the command line: {@code --first-admin=NAME}. */
@Component
class FirstAdmin {
    private final People people;
    private final String name;

    FirstAdmin(
            People people,
            @Value("${first-admin:}") String argument,
            @Value("${nearworld.first-admin:}") String setting) {
        this.people = people;
        this.name = argument.isBlank() ? setting.strip() : argument.strip();
    }

    /** Adds the first admin where there is nobody, or says how to name one and refuses to start. */
    void ensure() {
        if (!people.isEmpty()) {
            return;
        }
        if (name.isEmpty()) {
            throw new FirstAdminMissingException();
        }
        String password = People.randomPassword();
        people.add(name, name, Role.ADMIN, password, NewEntry.SYSTEM);
        Console.print("The first admin is \"" + name + "\" with the password " + password
                + "\nIt is shown this once and kept nowhere: write it down.");
    }
}
