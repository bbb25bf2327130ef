/** What the commands share: the invented experiments and the way to report errors. */
@NullMarked
package spgpe.examples.scenario;

import org.jspecify.annotations.NullMarked;
