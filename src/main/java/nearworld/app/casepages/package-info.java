/**
 * The pages of cases: list, case, recorded assessment, trail. Controllers only; depends on all features that it shows.
 */
@NullMarked
package nearworld.app.casepages;

import org.jspecify.annotations.NullMarked;
