/** Short, plain words that are read, said and typed without doubt: three to eight letters, each once. */
export const PASSPHRASE_WORDS: readonly string[] = `
  acorn adze album alder almond amber anchor antler apple april apron arbor arch archer armor arrow ash
  aspen atlas auger august autumn avenue aviator awl axle badge bagel baker bakery ballad balloon balsa
  bamboo banjo banner barge bark barley barn barrel basalt basil basin basket batten beacon bead beam bean
  bear beetle belt bench bend bevel bicycle biplane birch biscuit blank blanket blaze blend block bloom
  blossom blue bluebird boat bobbin bobcat bolt bonnet book boot borough bottle bowl box boxwood brace
  bracket bramble branch brass breeze brick bridge bright brisk bronze brook broom brush bubble bucket
  buckle budget bugle build bulb bundle bunny burl burrow bush butter button cabin cabinet cable cactus
  cadet calico caliper camel camera camp canal canary candid candle canoe canopy canteen canyon cape captain
  caramel caravan card cardinal cargo caribou carpet cart carton carve cashew castle catalog cave cavern
  cedar celery cello center chain chair chalk chamber channel chapter charm cheddar cheer cheese cherry
  chess chestnut chime chimney chisel cinder cinnamon circle circus citrus city clamp clarinet clean clear
  cleat clever cliff clock cloud clover coach coast coaster coat cobalt cobbler cocoa coconut coffee coil
  coin collar column comet comfort compass concert copper copy cork corn corner cosmic cotton couch cougar
  count courage cove cover cozy cradle crane crate crayon cream crescent cricket crisp crumb crystal cube
  cup cupboard curl curtain curve cushion cycle cypress daisy dance dapple dawn daylight decimal deck delta
  denim desk dial diamond dimple dinner disc dish dock dolphin dome door doorbell doorway dove dowel dozen
  dragon drawer dream dress drift drill drizzle drum duck dune dust eagle earth easel easy echo edge egg
  eighty elbow elder elegant elk elm ember emblem emerald empty engine envelope equal estuary even evening
  explorer fable fabric face fairway falcon fanfare farm farmer feather fence fern ferret ferry festival
  fiber fiddle field fifteen fifty fig file finch finger finish fire firefly fish five flag flame flamingo
  flannel flask flat fleet flint float floor fluent flute foam foil folder forest forge fork forty fountain
  fourteen fox foxglove frame freight fresh friday friend frog frost fruit funnel galaxy gallery gallon
  garage garden garland garlic garnet gauge gazebo gear gelato gentle geranium geyser ginger giraffe glacier
  glass glider globe glove glow glue gold goldfish gondola goose gopher gouge graceful grain grand granite
  granola grape graph gravel gravity gravy green grid grin grove guava guitar habit halo hammer hammock
  hamster hand handle handrail happy harbor hardy harmony harp harvest hat hatbox hatch hawk haystack hazel
  hazy hearth heather hedge hedgehog helmet hero heron hickory hill hillside hinge hive hobby hollow holly
  home honest honey honeydew hood hook hoop horizon horn hotel house humble hundred hut ice icing igloo
  iguana inch indigo ink inlay inlet insect iris iron island ivory ivy jacket jade jaguar jam jar jasmine
  jaybird jelly jersey jetty jewel jig jigsaw joiner journal journey jovial joyful juggle juice july june
  jungle juniper kayak keel keepsake kelp kennel kestrel kettle keyboard kind king kingdom kitchen kitten
  kiwi koala label lace ladder lagoon lake lamb lamp lantern larch large lark lasso latch lathe laurel lava
  lavender lawn layer leaf leather ledge legend lemon lemonade lemur lens leopard letter level library
  lifeboat lilac lily lilypad lime linden linen lion lively lizard loaf lobster locket locust log loom loop
  lotus lucky lullaby lumber lunar lunch lupine lyric macaw maestro magnet magnolia magpie mahogany mallet
  mandolin mango map marble march margin marigold mariner marker market marlin marmot marsh mason meadow
  measure mellow melody merit meter metro midday middle milk mill mimosa mineral mint mirror miter mitten
  modest molar molasses moment monarch monday month moon mortise mosaic moss moth motor mountain mouse
  muffin mulberry mulch museum mushroom music mustard napkin narrow nation nature nectar needle neon nest
  nettle nickel nimble nine noble noon notch note nougat novel nugget number nuthatch nutmeg nutshell oak
  oasis oat oatmeal oboe ocean octopus office olive omelet onion opal open opera orange orbit orchard order
  origami osprey ostrich otter outpost oval oven owl oxbow oyster package packet paddle page paint palace
  palm panda panel papaya paper paprika parade parasol parcel park parka parrot parsley pasta pastel pastry
  patch path patio pattern pavement peacock peanut pearl pebble pecan pelican pencil penguin penny peony
  pepper perch petal phone pianist piano piccolo pickle picnic picture pier pigeon pillar pillow pilot pine
  pinecone pink pipe pitcher pivot pizza plan planet plank plant plaster playful plaza plenty plywood pocket
  poem polar polish polite pollen pond pony popcorn poplar porch portal portrait postbox postcard potato
  pottery powder prairie pretzel primrose prism profile proper proud pudding puddle puffin pulley puma
  pumpkin pupil purple puzzle quail quarry quart quarter quartet queen quick quiet quill quilt quince quiver
  rabbit radar radio radish raft rail rainbow raindrop raisin rambler ramp ranch rapid rasp rattan raven
  ready record redwood reef reindeer relay restful ribbon rice riddle ridge ringlet ripple river riverbed
  road robin robot rock rocket roller roof rope rosebud rosemary rotor round router royal ruby rudder ruler
  rustic saddle saffron sailboat salad salmon salt salute sandbox sapling sapphire sardine satchel satin
  sausage sawdust scale scallop scarf scenic school schooner scooter scout scribe scroll seagull seahorse
  seashell season seat seed septet sesame seven seventy shade shadow shallow shamrock shape shark shed sheep
  shelf shell shelter shield shim shine ship shirt shoal shoe shop shore shovel shuttle sidewalk signal silk
  silver simple singer six sketch ski skirt sky skylark skyline slate sled sleeve sleigh slender slide sloop
  slope smile smooth snail snow snowball soap sofa soft solar solid songbird sonnet soup spark sparkle
  sparrow speckle sphere spice spider spinach spindle spiral splash splice spoke sponge spool spoon spring
  sprout spruce square squash squirrel stable staff stage stallion stamp star starfish starling station
  steady steam steeple stencil step stew sticker stone stork storm stove straw stream street string stripe
  studio sturdy sugar summer summit sunbeam sundial sunny sunrise sunset surf surface swallow swan sweater
  swift swimmer swing sycamore syrup table tackle tadpole tailor talon tandem tangelo tape tapestry target
  teacup teak teapot temple ten tenon tent terrace terrapin thicket thimble thirty thistle thread three
  thumb thunder ticket tidy tiger timber tinsel toast toaster toffee tomato tool topaz topsoil torch
  tortoise toucan tower town tractor trail train trapeze travel tray treasure tree treetop trellis triangle
  trinket trolley trombone trophy trout trowel truck truffle trumpet trunk tugboat tulip tumbler tundra
  tunnel turbine turnip turtle tweed twelve twenty twig twine twist ukulele umbrella unicorn union upland
  uplift upper upright urban useful valiant valley vanilla vanity vapor vase vault velour velvet veneer vest
  viaduct vibrant video viking village vine vineyard vintage viola violet violin visit visor vista vivid
  voice volcano voyage wafer waffle wagon walkway wallaby walnut walrus waltz warbler warm wash watch water
  wavelet wax weaver wedge wheat wheel whisk whisker whistle white wicker wide willow wind windmill window
  wing winter wintry wisdom wise wizard wolf wombat wonder woodland woodpile woodshed wool workshop world
  woven wreath wren wrist yard yarn year yearbook yellow yogurt yonder young zebra zenith zigzag zinc zinnia
  zipper
`
  .trim()
  .split(/\s+/);
