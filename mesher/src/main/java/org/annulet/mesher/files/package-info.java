/**
 * Meshes in and out of files.
 *
 * <p>Read: Gmsh MSH 2.2 and 4.1, text and binary (format as in the Gmsh reference manual, "MSH file
 * format"). Physical surfaces become zones, physical curves become named edges. Quadrilaterals are
 * split, nodes of no triangle dropped. Whatever is missing is an error that says where and lists
 * what is there.
 *
 * <p>Written: MSH 4.1 (text), with zones, edges and the period of a closed ring; it reads back to
 * the same mesh. A ring is written unrolled: nodes across the seam appear twice.
 *
 * <p>Files are not trusted: no count is believed before the bytes behind it are seen, and memory
 * stays within a fixed multiple of the file's size. Lengths in the file are in any unit the caller
 * states; in a mesh they are metres.
 */
package org.annulet.mesher.files;
