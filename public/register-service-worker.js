// Keeps the app on this device, so that it opens without network. When a newer version has been fetched and waits,
// the window hears `tallystone-update`, whose detail is a function that changes over and reloads.
;(() => {
  if (!('serviceWorker' in navigator)) return
  const { serviceWorker } = navigator
  let isChangingOver = false

  const announce = (worker) => {
    const changeOver = () => {
      isChangingOver = true
      worker.postMessage({ type: 'SKIP_WAITING' })
    }
    window.tallystoneUpdate = changeOver
    window.dispatchEvent(new CustomEvent('tallystone-update', { detail: changeOver }))
  }

  serviceWorker.addEventListener('controllerchange', () => {
    if (isChangingOver) window.location.reload()
  })

  serviceWorker.register('/service-worker.js', { updateViaCache: 'none' }).then(
    (registration) => {
      if (registration.waiting && serviceWorker.controller) announce(registration.waiting)
      registration.addEventListener('updatefound', () => {
        const worker = registration.installing
        worker?.addEventListener('statechange', () => {
          if (worker.state === 'installed' && serviceWorker.controller) announce(worker)
        })
      })
    },
    () => {
      // Private windows and old browsers refuse; the app then needs the network to open, and works otherwise.
    },
  )
})()
