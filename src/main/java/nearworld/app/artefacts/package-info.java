/**
 * Mortality tables and evidence packs as versioned artefacts. A published one never changes. Depends on the exchange
 * formats, people and the trail.
 */
@NullMarked
package nearworld.app.artefacts;

import org.jspecify.annotations.NullMarked;
