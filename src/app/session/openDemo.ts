import type { DroppedFile } from "./openDrop.ts";

/** The demo's files, from beside the page; they then take the same way as a drop. */
export async function openDemo(): Promise<DroppedFile[]> {
  const list: unknown = await (await fetchOwn("demo/files.json")).json();
  if (!Array.isArray(list)) throw new Error("The list of the demo's files cannot be read.");
  return Promise.all(
    list.map(String).map(async (path) => {
      const response = await fetchOwn(`demo/${path.split("/").map(encodeURIComponent).join("/")}`);
      return { path, file: new File([await response.blob()], path.split("/").at(-1) ?? path) };
    }),
  );
}

async function fetchOwn(path: string): Promise<Response> {
  const response = await fetch(path);
  if (!response.ok) throw new Error(`The demo is not there: ${path} was answered with ${response.status}.`);
  return response;
}
