/** Periodic grids in one and two dimensions: points, lengths, wave numbers, index order. */
@NullMarked
package spgpe.grid;

import org.jspecify.annotations.NullMarked;
