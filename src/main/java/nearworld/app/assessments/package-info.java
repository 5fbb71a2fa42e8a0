/**
 * The calculation of a case as it stands, and assessments: calculations that were recorded and never change. Depends on
 * artefacts, cases, forms, keys, people and the trail.
 */
@NullMarked
package nearworld.app.assessments;

import org.jspecify.annotations.NullMarked;
