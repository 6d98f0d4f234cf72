/** The report: one HTML file that opens offline. No physics. */
package org.annulet.post.report;
