/** Something that keeps the server from starting, in one line that says what to do. */
export class StartProblem extends Error {
  constructor(message: string) {
    super(message);
    this.name = 'StartProblem';
  }
}

/** The line for a failed file operation on the data folder, or undefined when the error is of another kind. */
export function explainFileError(error: unknown, folder: string): StartProblem | undefined {
  const { code } = (typeof error === 'object' && error !== null ? error : {}) as { code?: unknown };
  switch (code) {
    case 'ENOSPC':
    case 'EDQUOT':
      return new StartProblem(
        `The disk that holds ${folder} is full: make room, or set ELBOWROOM_DATA to another folder.`,
      );
    case 'EACCES':
    case 'EPERM':
    case 'EROFS':
      return new StartProblem(
        `${folder} cannot be written by this user: change its owner, or set ELBOWROOM_DATA to another folder.`,
      );
    case 'ENOTDIR':
    case 'EEXIST':
      return new StartProblem(
        `${folder} is not a folder: move it away, or set ELBOWROOM_DATA to another folder.`,
      );
    default:
      return undefined;
  }
}
