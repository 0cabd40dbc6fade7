/** Words that common passwords are made of; with digits and signs around them they stay common. Compared in lower case. */
export const commonWords = [
  'password', 'passwort', 'passphrase', 'passcode', 'motdepasse', 'contrasena', 'senha', 'parola', 'wachtwoord', 'kennwort', 'secret', 'geheim',
  'welcome', 'willkommen', 'bienvenue', 'letmein', 'login', 'signin', 'access', 'enter', 'admin', 'administrator', 'root', 'user', 'guest', 'test', 'testing',
  'default', 'change', 'changeme', 'please', 'temporary', 'temp', 'qwerty', 'qwertz', 'azerty', 'asdf', 'zxcv', 'qwer', 'abcd', 'abc',
  'hello', 'hallo', 'iloveyou', 'loveyou', 'love', 'lovely', 'sunshine', 'princess', 'dragon', 'monkey', 'football', 'baseball', 'basketball', 'soccer', 'hockey',
  'master', 'shadow', 'michael', 'jennifer', 'jessica', 'charlie', 'ashley', 'daniel', 'thomas', 'andrew', 'trustnoone', 'whatever',
  'freedom', 'flower', 'computer', 'internet', 'summer', 'winter', 'spring', 'autumn', 'january', 'february', 'march', 'april', 'june', 'july', 'august',
  'september', 'october', 'november', 'december', 'monday', 'friday', 'sunday', 'killer', 'hunter', 'chocolate', 'cheese', 'banana', 'coffee',
  'london', 'berlin', 'paris', 'england', 'germany', 'samantha', 'victoria', 'nicole', 'butterfly', 'forever', 'family', 'money',
  'laboratory', 'labor', 'lab', 'chemistry', 'chemie', 'chemist', 'sample', 'science', 'scientist', 'analyst', 'reviewer', 'student', 'lead', 'demo', 'steelyard', 'mylab', 'my', 'the', 'our', 'is', 'and', 'one',
] as const

/** Phrases that are widely used as they stand; spaces and signs between the words do not matter. */
export const commonPhrases = [
  'thisismypassword', 'thisisapassword', 'thisisasecret', 'mysecretpassword', 'ilovemyfamily', 'iloveyousomuch', 'iloveyouforever', 'letmeinplease', 'pleaseletmein',
  'correcthorsebatterystaple', 'opensesame', 'opensesameopen', 'nopasswordneeded', 'ihavenopassword', 'idontknowmypassword', 'forgotmypassword', 'iforgotmypassword',
  'passwordispassword', 'whatismypassword', 'guessmypassword', 'youcantguessthis', 'trustno1trustno1', 'tobeornottobe', 'tobeornottobethatisthequestion',
  'onceuponatime', 'happybirthday', 'merrychristmas', 'happynewyear', 'godblessyou', 'jesuslovesme', 'inthebeginning',
  'thequickbrownfox', 'thequickbrownfoxjumpsoverthelazydog', 'loremipsumdolor', 'loremipsumdolorsitamet',
  'newyorkcity', 'sanfrancisco', 'losangeles', 'unitedkingdom', 'unitedstates',
  'administrateur', 'adminadminadmin', 'rootrootroot', 'testtesttest', 'changemechangeme', 'changethispassword', 'temporarypassword', 'defaultpassword',
  'onetwothreefour', 'onetwothreefourfive', 'einszweidreivier', 'abrakadabra', 'abracadabra', 'dontforgetthis', 'donotforget', 'donttellanyone', 'nobodyknows',
] as const

/** Rows of keys and the orders in which they are walked; read forwards and backwards, and round again. */
export const keyWalks = [
  '0123456789', '1234567890', 'abcdefghijklmnopqrstuvwxyz', 'qwertyuiop[]', 'asdfghjkl;\'', 'zxcvbnm,./', 'qwertzuiop', 'yxcvbnm,.-', 'azertyuiop', 'qsdfghjklm', 'wxcvbn',
  '1qaz2wsx3edc4rfv5tgb6yhn7ujm8ik9ol0p', 'qazwsxedcrfvtgbyhnujmikolp', '1q2w3e4r5t6y7u8i9o0p', 'q1w2e3r4t5y6u7i8o9p0', 'a1b2c3d4e5f6g7h8i9', '1a2b3c4d5e6f7g8h9i', '!@#$%^&*()', '!"£$%^&*()', '-=',
] as const
