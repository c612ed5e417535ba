// The page's own copy of itself: all of it is kept at the first visit, and served from there ever after. `copy` is put
// before this text by the build: the version of the copy, and the names of all files it is made of.
/* global copy */
const prefix = "waneline-";
const name = prefix + copy.version;

self.addEventListener("install", (event) => {
  event.waitUntil(caches.open(name).then((cache) => cache.addAll(copy.files)));
});

// a new copy takes over when the last page of the old one is closed: no page is made of two versions
self.addEventListener("activate", (event) => {
  const old = (key) => key.startsWith(prefix) && key !== name;
  event.waitUntil(
    caches.keys().then((keys) => Promise.all(keys.filter(old).map((key) => caches.delete(key)))),
  );
});

self.addEventListener("fetch", (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== "GET" || url.origin !== self.location.origin) return;
  event.respondWith(request.mode === "navigate" ? page(request) : own(request));
});

async function page(request) {
  const cache = await caches.open(name);
  return (await cache.match("./", { ignoreVary: true })) ?? fetch(request);
}

/** From the copy; what is not in it (the demo's records) is fetched once and kept. */
async function own(request) {
  const cache = await caches.open(name);
  // servers say that answers vary with the origin; there is but one here
  const kept = await cache.match(request, { ignoreSearch: true, ignoreVary: true });
  if (kept) return kept;
  const answer = await fetch(request);
  if (answer.ok) await cache.put(request, answer.clone());
  return answer;
}
