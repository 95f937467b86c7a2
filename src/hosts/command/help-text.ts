/** What `crosstrack help` prints. */
export const helpText = `Crosstrack: winds over the sea from scatterometer swath files, offline.

  crosstrack inspect FILE... [--json]
      Read files without storing them and say what they hold.
  crosstrack load FILE|FOLDER... [--archive PATH]
      Store files in the archive. A file that is already there is not stored again.
  crosstrack passes [--archive PATH] [--json]
      List the passes in the archive, newest first.
  crosstrack remove PASS... [--archive PATH]
      Remove passes from the archive by the numbers that 'passes' lists.
  crosstrack help
      Show this text.

The archive is the file --archive names, else the one CROSSTRACK_ARCHIVE names, else archive.db in the folder where
this system keeps the data of applications. 'npm start' opens the chart.

It ends with 0 when all was done, 1 when some files could not be read, 2 when the command was not understood.
`;
