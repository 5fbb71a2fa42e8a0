/**
 * What all pages share: numbers, dates and sentences in the reader's language, error pages, and the gallery of page
 * parts. No rules of the business.
 */
@NullMarked
package nearworld.app.web;

import org.jspecify.annotations.NullMarked;
