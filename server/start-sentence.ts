const connectionErrors = /^Sequelize(Connection|Host|Access|Invalid).*Error$/;
const networkCodes = new Set(["ECONNREFUSED", "ENOTFOUND", "ETIMEDOUT", "ECONNRESET", "EHOSTUNREACH"]);
const databaseCodes: Record<string, string> = {
  "28P01": "it refuses the password",
  "28000": "it refuses the user",
  "3D000": "there is no such database",
  "57P03": "it is still starting",
  "53300": "it has no connection left",
};

/** One sentence for whoever started the process and must mend it; a fault of our own keeps its trace. */
export function startSentence(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  // Sequelize keeps the database's own error within its own.
  const cause: unknown = "original" in error ? error.original : error;
  const code = cause instanceof Error && "code" in cause && typeof cause.code === "string" ? cause.code : "";
  if (error.name === "ConfigurationError" || error.name === "StartRefused") return error.message;
  if (code === "EADDRINUSE" && "port" in error)
    return `Port ${String(error.port)} is in use; set PORT to another one or stop what listens there.`;
  if (code === "EACCES" && "syscall" in error && error.syscall === "listen")
    return "This user may not listen on that port; set PORT to one above 1023.";
  const databaseReason = databaseCodes[code];
  if (databaseReason !== undefined) return `The database of DATABASE_URL cannot be used: ${databaseReason}.`;
  if (connectionErrors.test(error.name) || networkCodes.has(code))
    return "The database of DATABASE_URL cannot be reached; start it or set DATABASE_URL right.";
  return error.stack ?? error.message;
}
