/**
 * Checks of the engine against what lies outside the project: worked cases, published tables, textbooks, closed forms; and
 * what must hold whatever the numbers are. The readers of {@code exchange} turn the texts into what the engine takes.
 */
package nearworld.engine;
