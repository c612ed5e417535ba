/** The first characters of every workspace file; what follows them is not looked at. */
export const workspaceMark = '{"kind":"waneline workspace"';

/** Whether a file claims to be a workspace. */
export async function isWorkspaceFile(file: Blob): Promise<boolean> {
  return (await file.slice(0, workspaceMark.length).text()) === workspaceMark;
}
