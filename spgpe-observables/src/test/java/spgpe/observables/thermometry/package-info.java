@NullMarked
package spgpe.observables.thermometry;

import org.jspecify.annotations.NullMarked;
