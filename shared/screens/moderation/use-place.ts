import { useState } from 'react';
import { nowhere, settledPlace, type Place } from './place';

type IdAt = (row: number) => string | undefined;

/** The row looked at, which keeps to its answer while the list moves under it. Rows come by the place, so the caller asks for them first. */
export function usePlace() {
  const [stored, setPlace] = useState<Place>(nowhere);
  return {
    at: stored.at,
    /** To be called in each drawing, with the rows that have come. */
    settle: (idAt: IdAt): Place => {
      const place = settledPlace(stored, idAt);
      if (place !== stored) setPlace(place);
      return place;
    },
    setPlace,
  };
}
