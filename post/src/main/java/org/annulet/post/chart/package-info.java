/** Charts as SVG text. No physics. */
package org.annulet.post.chart;
