/** What each garden grows: plant key and height in millimetres. Something is in flower in every garden's list in most months, and in the club's in all. */
export const PLANTING: Readonly<Record<string, readonly (readonly [plantKey: string, heightMm: number])[]>> = {
  'saltmarsh-and-plover': [['thrift', 150], ['blue-fescue', 200], ['stonecrop', 50], ['moss-phlox', 80], ['winter-heather', 180], ['hardy-cyclamen', 90], ['creeping-juniper', 150]],
  'mossgill-quarry-tramway': [['irish-moss', 25], ['lady-fern', 160], ['maidenhair-spleenwort', 110], ['dwarf-cypress', 460], ['mossy-saxifrage', 90], ['lily-of-the-valley', 180], ['snowdrop', 120], ['ling', 200], ['christmas-rose', 200]],
  'pine-barrow-light-railway': [['mother-of-thyme', 50], ['dwarf-spruce', 500], ['mountain-pine', 400], ['star-creeper', 25], ['thrift', 150], ['miniature-rose', 200], ['bell-heather', 180], ['winter-aconite', 80], ['algerian-iris', 250]],
  'thistledown-junction': [['dwarf-apple', 620], ['thrift', 140], ['houseleek', 70], ['woolly-thyme', 30], ['netted-iris', 120], ['autumn-crocus', 150], ['chamomile', 90], ['darley-heather', 220]],
  'copperkettle-and-western': [['mountain-pine', 380], ['dwarf-iris', 200], ['houseleek', 80], ['bell-heather', 200], ['snowdrop', 120], ['ling', 220], ['moss-phlox', 70], ['christmas-rose', 190]],
  'tansy-bank-and-dunlin': [['purple-allium', 700], ['chives', 250], ['tansy', 400], ['chamomile', 80], ['mother-of-thyme', 40], ['dwarf-lavender', 300], ['hoop-daffodil', 150], ['coum-cyclamen', 80]],
  'old-orchard-line': [['dwarf-apple', 640], ['lady-fern', 150], ['lily-of-the-valley', 180], ['hoop-daffodil', 140], ['autumn-crocus', 140], ['winter-aconite', 70], ['houseleek', 60], ['coum-cyclamen', 80]],
  'nightjar-mineral-railway': [['dwarf-cypress', 420], ['ling', 240], ['bell-heather', 180], ['blue-fescue', 190], ['stonecrop', 50], ['winter-heather', 160], ['drumstick-allium', 450]],
  'bellwether-street-tram': [['houseleek', 60], ['dwarf-cypress', 440], ['miniature-rose', 220], ['mossy-saxifrage', 80], ['coum-cyclamen', 80], ['netted-iris', 110], ['star-creeper', 20]],
  'curlew-pier-railway': [['thrift', 160], ['blue-fescue', 220], ['stonecrop', 40], ['winter-heather', 150], ['dwarf-lavender', 280], ['hardy-cyclamen', 90]],
  'inchworm-and-vale': [['dwarf-iris', 210], ['thrift', 150], ['dwarf-spruce', 480], ['purple-allium', 650], ['snowdrop', 110], ['star-creeper', 25], ['miniature-rose', 210], ['autumn-crocus', 150], ['algerian-iris', 240]],
  'gorsefoot-timber-line': [['dwarf-spruce', 560], ['creeping-juniper', 160], ['lady-fern', 170], ['irish-moss', 25], ['snowdrop', 120], ['mossy-saxifrage', 90], ['ling', 210], ['winter-aconite', 70]],
};
