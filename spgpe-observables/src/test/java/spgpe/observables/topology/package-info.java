@NullMarked
package spgpe.observables.topology;

import org.jspecify.annotations.NullMarked;
