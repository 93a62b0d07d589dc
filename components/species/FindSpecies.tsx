'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useRef, useTransition } from 'react';
import { isChanged } from '@/components/form/changed';

const PAUSE_MS = 150;

/** Finds as you type; without a script, its button does. */
export function FindSpecies({ q, wood, oldWood }: { q: string; wood: string; oldWood: string }) {
  const router = useRouter();
  const form = useRef<HTMLFormElement>(null);
  const pause = useRef<ReturnType<typeof setTimeout>>(undefined);
  const [finding, start] = useTransition();
  useEffect(() => {
    // A name may have been typed before this script was there to hear of it.
    if (form.current && isChanged(form.current)) form.current.requestSubmit();
    return () => clearTimeout(pause.current);
  }, []);

  const find = () => {
    if (!form.current) return;
    const asked = new URLSearchParams();
    new FormData(form.current).forEach((value, name) => {
      if (value) asked.set(name, String(value));
    });
    start(() => router.replace(`/species?${asked}`, { scroll: false }));
  };
  const findSoon = () => {
    clearTimeout(pause.current);
    pause.current = setTimeout(find, PAUSE_MS);
  };

  return (
    <form
      ref={form}
      action="/species"
      role="search"
      onChange={findSoon}
      onSubmit={(event) => {
        event.preventDefault();
        find();
      }}
      className="mt-4 flex flex-wrap items-end gap-4"
    >
      <label className="grow">
        <span className="block text-note text-soft">Name: scientific, English, Spanish or French</span>
        <input
          name="q"
          type="search"
          defaultValue={q}
          maxLength={500}
          className="field w-full border-2"
          autoComplete="off"
        />
      </label>
      <label>
        <span className="block text-note text-soft">Wood</span>
        <select name="wood" defaultValue={wood} className="field">
          <option value="">any</option>
          <option value="soft">soft, below 0.45</option>
          <option value="medium">medium, 0.45 to 0.56</option>
          <option value="hard">hard, from 0.56 g/cm³</option>
          <option value="unknown">not known</option>
        </select>
      </label>
      <label>
        <span className="block text-note text-soft">Resprouts from old wood</span>
        <select name="oldWood" defaultValue={oldWood} className="field">
          <option value="">any</option>
          <option value="yes">yes</option>
          <option value="weak">weakly</option>
          <option value="no">no</option>
        </select>
      </label>
      <button className="action-plain">Find</button>
      <span role="status" className="w-full text-note text-soft">
        {finding ? 'Finding…' : ''}
      </span>
    </form>
  );
}
