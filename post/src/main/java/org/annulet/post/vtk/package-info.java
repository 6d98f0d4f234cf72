/**
 * Files for open viewers: VTU (appended raw data, zlib, 64-bit headers) and PVD collections. The
 * mesh is shown as it is, or laid round the axis. No physics.
 */
package org.annulet.post.vtk;
