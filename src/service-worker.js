/*
 * Opens the application where there is no signal: the page and everything it is built of are kept on the device when this
 * version is installed. Nothing of the interface to the server is ever answered from here; entries made without a signal
 * wait in the outbox of the page (src/lib/outbox.ts). `version` and `files` are filled in by the build.
 */
const version = '__VERSION__'
const files = __FILES__
const cacheName = `pratique-${version}`

self.addEventListener('install', (event) => {
  event.waitUntil(
    caches
      .open(cacheName)
      .then((cache) => cache.addAll(['/', ...files]))
      .then(() => self.skipWaiting()),
  )
})

self.addEventListener('activate', (event) => {
  event.waitUntil(
    caches
      .keys()
      .then((names) =>
        Promise.all(names.filter((name) => name !== cacheName).map((name) => caches.delete(name))),
      )
      .then(() => self.clients.claim()),
  )
})

self.addEventListener('fetch', (event) => {
  const { request } = event
  const url = new URL(request.url)
  if (request.method !== 'GET' || url.origin !== self.location.origin || url.pathname.startsWith('/api/'))
    return
  if (request.mode === 'navigate') {
    event.respondWith(fetch(request).catch(() => caches.match('/', { cacheName })))
    return
  }
  // names of assets change with their content, so what is kept is right
  if (url.pathname.startsWith('/assets/'))
    event.respondWith(caches.match(request, { cacheName }).then((kept) => kept ?? fetchAndKeep(request)))
})

/** A sheet that was opened once opens again without a signal. */
async function fetchAndKeep(request) {
  const answer = await fetch(request)
  if (answer.ok) {
    const copy = answer.clone()
    caches
      .open(cacheName)
      .then((cache) => cache.put(request, copy))
      .catch(() => undefined)
  }
  return answer
}
