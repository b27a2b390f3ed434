import { readTable } from './read-claims-table.ts';

/**
 * What claims are judged to be, with innocent ones near the line. Columns: verdicts (`m` a
 * medicine or drug, `x` contradicted, `e` to be shown, `-` nothing; for all markets, or for EU and
 * UK, then US and CA), the formula, the claim, its language. The reading is the tables' makers' own
 * (common practice, no source) along the sources that `data/parameters/claims.json` names.
 */
export const CLAIMS = readTable(`
# disease and its treatment
m | gel | Treats eczema
- | gel | Treat yourself
- | gel | A treat for the whole family
m | gel | Cures psoriasis
- | soap | Cured for six weeks on wooden racks
m | gel | Prevents acne
- | gel | We acknowledge every letter
- | gel | Reaches the acme of lather
m | gel | Acne cream
e | gel | For acne-prone skin
m | cream | Relieves eczema and rosacea
m | cream | Eczema relief
m | cream | ECZEMA RELIEF
m | cream | Soothes dermatitis
- | cream | Soothes the senses
- | cream | Soothes dry skin
m | cream | Heals dry skin
- | cream | Healthy-looking skin
- | cream | For healthy hair
- | cream | In good health and good humour
- | cream | Head to heel softness
m | cream | Heals cracked heels
- | cream | For cracked heels
- | cream | Comforts dry heels and elbows
m | cream | Pain-relieving rub
- | cream | Painless to rinse out
- | cream | Painted by hand
m | cream | Back pain cream
m | cream | Relief from muscle pain
- | cream | After a long day on your feet
- | cream | Warms as you rub it in
m | cream | Anti-inflammatory balm
m | cream | Reduces inflammation
- | cream | Keep away from heat: flammable
m | cream | Antiseptic
m | gel | Disinfects hands
m | gel | Kills bacteria
- | gel | Washes away dirt and bacteria
- | gel | Won't kill the mood
m | gel | Antiviral hand wash
m | gel | Anti-fungal
- | gel | Fun for children
m | gel | Fights athlete's foot
- | gel | For athletes and their feet
m | gel | Treats head lice
- | gel | Lightly scented with nothing
m | cream | Prevents diaper rash
m | cream | Soothes sunburn
- | cream | After a day in the sun
m | cream | Therapeutic bath
- | cream | A therapy session for your bathroom shelf
m | cream | Medicinal-strength balm
- | cream | Median drying time: one minute
m | cream | Treats insomnia
m | cream | Relieves anxiety and depression
- | cream | Leaves no depression in the jar unfilled
m | cream | Cancer prevention
m | cream | Lowers blood pressure
- | cream | Pressed by hand
m | cream | Balances hormones
m | cream | Strengthens the immune system
m | cream | Burns fat
- | cream | Burns with a steady flame
m | cream | Helps you lose weight
- | cream | Weighs 110 g
m | cream | Numbs the skin
- | cream | A number of small pleasures
m | cream | Regrows hair
- | rich | For hair that has grown long
m | rich | Promotes hair growth
m | rich | Lash growth serum
m | cream | Varicose veins cream
m | cream | Treats burns and wounds
- | cream | Wound on a spool by hand
m | cream | Treats warts
m | cream | Repels ticks and cures hives
m | cream | Alleviates hay fever
m | cream | Removes haemorrhoids
m | cream | Relieves itching from eczema
- | cream | Itching to try it
- | cream | Not intended to treat, cure or prevent any disease
- | cream | This is not a medicine
- | cream | Does not heal wounds
- | cream | No more bad hair days
m | cream | No more eczema
m | cream | Say goodbye to acne
m | cream | Not only softens but also heals
m | cream | Proven to cure eczema
m | gel | Acne treatment
m | cream | Migraine balm
- | cream | With mild surfactants, nothing more
m | cream | For skin suffering from psoriasis
m | gel | Treatment for acne scars

# the drug line of the United States and Canada; cosmetic effects elsewhere, to be shown
e m | cream | SPF 30
e m | cream | SPF30+
e m | cream | Broad spectrum sunscreen
- | cream | Sunny days in a jar
- | cream | Made with sunflower oil
- | cream | Special offer
e m | cream | Protects against UVA and UVB
e m | gel | Antiperspirant
e m | gel | Reduces sweat
- | gel | For a fresh feeling after sport
- | gel | Keeps you fresh
- | gel | Wash away sweat and dust
e m | gel | Anti-dandruff shampoo
e m | gel | Controls dandruff
- | gel | Dandelion yellow bottle
e m | gel | Fights cavities
- | gel | Whole mouth freshness
e m | gel | Antibacterial hand soap
e m | gel | Antimicrobial
e m | cream | Boosts collagen
e m | cream | Increases elastin production
e m | cream | Regenerates skin cells
- | cream | Packed in cellulose film
e m | cream | Detoxifies
e m | cream | Stimulates circulation
- | cream | In circulation since spring
e m | cream | Reduces cellulite
e m | cream | Removes wrinkles
e - | cream | Reduces the look of wrinkles
e - | cream | Reduces the appearance of fine lines
e - | cream | Smooths the look of cellulite
- | cream | Wrinkled labels are replaced free
- | cream | Line your basket with our paper
e | cream | Anti-ageing
e | cream | Anti-aging
e - | cream | Anti-ageing look
- | cream | Aged in oak
- | cream | For all ages
e m | cream | Lightens skin
e m | cream | Fades age spots
- | cream | Brightens your morning
e m | cream | Skin bleaching cream
e m | cream | Reverses ageing
e m | cream | Relieves stress
- | cream | A calm moment at the end of the day
- | cream | Relax and unwind
- | cream | Stress the bottle gently
e m | gel | Aids sleep
- | gel | For a bath before bed

# contradicted by the composition
x | rich | Paraben-free
x | rich | paraben free
x | rich | PARABEN‑FREE
x | rich | Free from parabens
x | rich | No parabens
x | rich | Without parabens
x | rich | Contains no parabens
x | rich | 0% parabens
x | rich | Free of parabens, silicones and dyes
x | rich | Paraben- and silicone-free
x | rich | Not made with parabens
- | rich | With parabens
x | rich | Silicone-free
x | rich | Sulfate-free
x | rich | Sulphate-free
x | rich | SLES-free
e | rich | SLS-free
x | rich | Alcohol-free
- | cream | Alcohol-free
- | gel | Alcohol-free
- | gel | Sulfate-free
- | gel | Silicone-free
e - | gel | Paraben-free
e - | gel | No parabens
x | cream | Fragrance-free
x | cream | Perfume-free
x | cream | Unscented
x | rich | Fragrance-free
- | gel | Fragrance-free
- | gel | Unscented
- | plain | No added fragrance
- | cream | Free fragrance sample with each order
x | gel | Preservative-free
x | cream | Free from preservatives
e - | plain | Preservative-free
x | rich | Mineral-oil-free
- | gel | Mineral-oil-free
x | rich | No petrolatum
x | balm | Vegan
x | balm | Suitable for vegans
e | gel | Vegan
- | plain | Vegan
x | balm | Free from animal products
x | balm | Beeswax-free
- | balm | Not vegan
x | soap | Soap-free
- | gel | Soap-free
x | rich | Dye-free
x | rich | No colourants
- | gel | Free from colourants
x | rich | Gluten-free
x | rich | Nut-free
e | gel | Nut-free
e | plain | Gluten-free
x | balm | Oil-free
x | cream | Oil-free
- | gel | Oil-free
e | gel | Palm-oil-free
- | plain | Palm-free
x | cream | Waterless
x | gel | Anhydrous
- | balm | Waterless
x | rich | PEG-free
- | gel | PEG-free
x | rich | EDTA-free
x | rich | Dimethicone-free
x | gel | Free from phenoxyethanol
x | rich | Free from essential oils
e | cream | Free from essential oils
x | cream | Allergen-free
e | gel | Allergen-free
e | cream | No phthalates
e - | gel | Formaldehyde-free
x | cream | With argan oil
x | cream | Contains shea butter and argan oil
- | cream | With shea butter
- | cream | Enriched with vitamin E
x | gel | Enriched with vitamin E
- | cream | With hyaluronic acid
x | gel | With hyaluronic acid
- | gel | With oat
- | gel | Oat extract
x | gel | Infused with rose water
- | gel | As soft as silk
- | cream | Rose scent
e | cream | A touch of rose
x | cream | With 10 % glycerin
- | cream | With 4 % glycerin
- | cream | Contains 12 % sunflower oil
x | cream | 20 % shea butter
x | rich | 100 % natural
x | rich | All natural
- | plain | Natural shine
e | plain | 100 % natural
e | gel | Natural
e | gel | 98.5 % natural origin
x | gel | Chemical-free
x | gel | Free from chemicals
x | gel | Approved by the FDA
x | gel | EU approved
x | gel | Health Canada approved
x | soap | pH 5.5
- | gel | pH 5.3
x | soap | pH-balanced
- | gel | pH-balanced
e | cream | pH-balanced
x | soap | pH neutral

# to be shown
e | gel | Hypoallergenic
e | gel | HYPO-ALLERGENIC
- | gel | Contains no allergy advice
e | gel | Dermatologically tested
e | gel | Dermatologist recommended
- | gel | Tested by our own family
e | gel | Clinically proven
- | gel | Clinical white bottle
e | gel | 90 % saw softer skin
e | gel | 9 out of 10 would buy it again
- | gel | 20 % off this week
e | gel | Bottle of 50 % recycled glass fits any shelf
e | gel | Cruelty-free
e | gel | Not tested on animals
e | gel | Organic
- | gel | Organise your shelf
- | gel | Organza bag included
e | gel | Non-toxic
e | gel | Safe for babies
e | gel | For babies
- | gel | Keep out of reach of babies
- | gel | Keep in a safe place
e | gel | Non-comedogenic
e | gel | Eco-friendly
e | gel | Biodegradable
- | gel | Free from plastic wrap
e | gel | The best body wash
- | gel | Best before end: see base
- | gel | Best kept in a dry dish
e | gel | Better than other soaps
e - | cream | 24h moisture
- | cream | Use within 12 months
- | cream | Open 24 hours
e - | cream | Suitable for sensitive skin
- | cream | A sensitive choice of gift
e - | cream | Repairs damaged hair
- | cream | Repair service for pumps
e - | cream | Waterproof
e - | cream | Long-lasting hydration
e - | rich | Anti-frizz
e - | gel | Complies with EU law
e | gel | GMO-free
e | gel | Reef safe
e | gel | Clean beauty
- | gel | Cleans beautifully
e | gel | Free from harmful ingredients
- | gel | No harm in a second wash
- | gel | Perfect for travel
e | gel | Award-winning
- | gel | Unique gift box
e | gel | Made in Canada
e | gel | Doctor recommended
- | gel | Just what the garden ordered

# innocent
- | gel | Leaves skin feeling soft
- | gel | Cleanses gently
- | gel | Creamy lather
- | cream | Moisturises and softens
- | cream | Conditions dry skin
- | cream | Helps keep skin supple
- | cream | Non-greasy
- | cream | Quickly absorbed
- | cream | Masks odour
- | rich | Adds shine and body
- | rich | Easy to comb
- | gel | Made by hand in small batches
- | gel | Refillable bottle
- | gel | Gift-wrapped on request
- | gel | With mild surfactants
- | gel | For him and her
- | gel | A daily ritual
- | gel | Wake up to the smell of rain
- | gel | Rinses off easily
- | balm | Melts on the lips
- | balm | Glossy finish
- | soap | Long-lasting bar
- | soap | Hard-wearing bar for the kitchen
- | plain | A few drops are enough
- | plain | Cold pressed
- | cream | Improves the appearance of dry skin
- | cream | Protects hands from drying out
- | cream | Masculine scent
- | cream | Cedar and vetiver notes
- | gel | Cares for skin

# German and French basics
m | gel | Hilft bei Neurodermitis | de
m | gel | Entzündungshemmend | de
- | gel | Für sanfte Pflege | de
- | gel | Heil ankommen nach einem langen Tag | de
x | rich | Ohne Parabene und Silikone | de
x | rich | silikonfrei | de
e - | gel | Parabenfrei | de
x | balm | Vegan | de
x | cream | Parfümfrei | de
e | gel | Ohne Tierversuche | de
e | gel | Hypoallergen | de
e m | cream | Lichtschutzfaktor 30 | de
- | gel | Macht die Haut weich | de
- | gel | Aus eigener Fertigung | de
m | gel | Soulage la douleur | fr
m | gel | Traite l'acné | fr
- | gel | Un pain de savon doux | fr
x | rich | Sans parabènes | fr
x | cream | Sans parfum | fr
- | gel | Sans parfum | fr
x | balm | Végane | fr
e | gel | Hypoallergénique | fr
e m | cream | Protection solaire | fr
- | gel | Nettoie en douceur | fr
- | gel | Fabriqué à la main | fr
`);
