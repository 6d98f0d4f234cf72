/** The command line: verbs, exit status, progress. The only place that prints. */
package org.annulet.cases.cli;
