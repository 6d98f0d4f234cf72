/**
 * Studies made of many independent points: shared out over processes, kept as they are finished,
 * gone on with after a stop, and put together again. A point's result is what its text form says,
 * so that a result read from a file is the very one that was computed.
 */
package org.annulet.cases.points;
