'use client';

import { useState } from 'react';

/** Asks the device for its place, and only when it is pressed. */
export function WhereIStand({ onPoint }: { onPoint: (latitude: string, longitude: string) => void }) {
  const [state, setState] = useState('');

  function ask() {
    if (!('geolocation' in navigator))
      return setState('This device does not tell its place. Type the point in.');
    setState('Asking the device');
    navigator.geolocation.getCurrentPosition(
      ({ coords }) => {
        onPoint(coords.latitude.toFixed(5), coords.longitude.toFixed(5));
        setState(`Filled in, to about ${Math.max(1, Math.ceil(coords.accuracy))} m.`);
      },
      () => setState('The device did not tell its place. Type the point in.'),
      { enableHighAccuracy: true, timeout: 20_000, maximumAge: 60_000 },
    );
  }

  return (
    <p className="mt-3 flex flex-wrap items-center gap-3">
      <button type="button" className="action-plain" onClick={ask}>
        Take where I stand
      </button>
      <span role="status" className="text-soft">
        {state}
      </span>
    </p>
  );
}
