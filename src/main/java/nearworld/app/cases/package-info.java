/**
 * Cases: five sections, each with a version of its own, stored as typed and as the valid part of {@code case/1}, and who
 * sees them. Depends on artefacts, forms, keys, people and the trail.
 */
@NullMarked
package nearworld.app.cases;

import org.jspecify.annotations.NullMarked;
